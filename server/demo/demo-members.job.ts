import type { AppContext } from '../context.ts';
import { joinWithTestCard } from '../payments/test-card.service.ts';
import { syncTier } from '../payments/sync-tier.job.ts';
import { findPersonByEmail } from '../people/people.queries.ts';
import { findOpenTiers } from '../tiers/tiers.queries.ts';
import { DEMO_ACCOUNTS } from './accounts.ts';

/** Buys the memberships of the demonstration's members, as they would have bought them; who holds one is left alone. */
export async function joinDemoMembers(ctx: AppContext): Promise<void> {
  if (ctx.settings.mode !== 'demo') return;
  for (const tier of await findOpenTiers(ctx.db)) {
    const accounts = DEMO_ACCOUNTS.filter(({ rank }) => rank === tier.rank);
    if (accounts.length > 0 && tier.sync !== 'in-step') await syncTier(ctx, { tierId: tier.id });
    for (const { email } of accounts) {
      const person = await findPersonByEmail(ctx.db, email);
      if (person) await joinWithTestCard(ctx, person, tier.id);
    }
  }
}
