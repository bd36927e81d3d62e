import type { Request, RequestHandler } from 'express';
import type { AppContext } from '../context.ts';
import { entitledRank, type Membership } from '../gate/entitlement.ts';
import type { Viewer } from '../http/viewer.ts';
import { findViewerRow, type ViewerRow } from './viewer.queries.ts';

/** Finds out who asks, once a request, from the session's person and the membership as it stands now. */
export function loadViewer(ctx: AppContext): RequestHandler {
  return async (request, _response, next) => {
    await reloadViewer(ctx, request);
    next();
  };
}

/** Finds it out again, after signing in. */
export async function reloadViewer({ db, now }: AppContext, request: Request): Promise<void> {
  const personId = signedInPerson(request);
  const row = personId ? await findViewerRow(db, personId) : undefined;
  request.viewer = toViewer(row, request.session.ageConfirmed === true, now());
}

/** The id that sign-in put into the session. */
function signedInPerson(request: Request): string | null {
  return typeof request.user === 'object' ? request.user.id : null;
}

function toViewer(row: ViewerRow | undefined, ageConfirmed: boolean, now: Date): Viewer {
  if (!row) return { person: null, membership: null, rank: 0, ageConfirmed };
  const membership = toMembership(row);
  return {
    person: { id: row.id, email: row.email, name: row.name, verified: row.verified_at !== null, roles: row.roles },
    membership,
    rank: entitledRank(membership, row.grace_days, now),
    ageConfirmed: ageConfirmed || row.age_confirmed_at !== null,
  };
}

function toMembership(row: ViewerRow): Membership | null {
  if (row.state === null || row.rank === null || row.tier_name === null) return null;
  return {
    rank: row.rank,
    tierName: row.tier_name,
    state: row.state,
    paidUntil: row.paid_until,
    endsAt: row.ends_at,
    pastDueSince: row.past_due_since,
  };
}
