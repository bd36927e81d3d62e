import type { Knex } from 'knex';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from '../../server/demo/accounts.ts';
import { addJob } from '../../server/jobs/queue.ts';
import { hashPassword } from '../../server/people/passwords.ts';
import { insertPerson } from '../../server/people/people.queries.ts';
import type { DemoContent } from '../content/content.ts';

export type DemoPeople = Record<(typeof DEMO_ACCOUNTS)[number]['part'], string>;

/** The accounts of the demonstration; their ids by the part they play. */
export async function seedPeople(db: Knex): Promise<DemoPeople> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  const people: Partial<DemoPeople> = {};
  for (const { email, part, name, roles } of DEMO_ACCOUNTS) {
    const person = await insertPerson(db, {
      ...{ email, name, roles },
      password_hash: passwordHash,
      verified_at: new Date(),
      age_confirmed_at: new Date(),
    });
    people[part] = person.id;
  }
  return people as DemoPeople;
}

/** The imprint and its tiers; the payment service learns of the tiers, and of the demo's members, by their jobs. */
export async function seedHouse(db: Knex, { imprint, tiers }: DemoContent): Promise<void> {
  const { name, currency, zone, ageLimit, graceDays, terms, privacy } = imprint;
  await db('imprint').update({ name, currency, zone, terms, privacy, age_limit: ageLimit, grace_days: graceDays });
  for (const tier of tiers) {
    const [row] = await db('tiers')
      .insert({ ...tier, currency })
      .returning('id');
    await addJob(db, 'sync-tier', { tierId: row!.id });
  }
  await addJob(db, 'join-demo-members', {});
  await addJob(db, 'join-demo-members', {});
}
