import type { Request } from 'express';
import type { AppContext } from '../context.ts';
import type { SessionView } from '../../shared/contracts/session.ts';
import { countFailure, forgetFailures, refuseWhenLimited } from '../http/failure-limits.ts';
import type { Viewer } from '../http/viewer.ts';
import { readImprint } from '../imprint/imprint.queries.ts';
import { wrongCredentials } from './people.errors.ts';
import { openSessionFor } from './sign-in.ts';

/** Signs in; only failures count towards the limits, and a success forgets those of this address. */
export async function signIn({ db }: AppContext, request: Request, email: string): Promise<void> {
  const place = request.ip ?? 'unknown';
  const key = `${email}|${place}`;
  await refuseWhenLimited(db, 'sign-in', key);
  await refuseWhenLimited(db, 'sign-in-place', place);
  const person = await request.app.locals.signIn.check(request);
  if (!person) {
    await Promise.all([countFailure(db, 'sign-in', key), countFailure(db, 'sign-in-place', place)]);
    throw wrongCredentials();
  }
  await forgetFailures(db, 'sign-in', key);
  await openSessionFor(request, person);
}

/** Remembers that the reader is old enough: with the account, or with the session of a visitor. */
export async function confirmAge({ db, now }: AppContext, viewer: Viewer, request: Request): Promise<void> {
  request.session.ageConfirmed = true;
  if (viewer.person) await db('people').where({ id: viewer.person.id }).update({ age_confirmed_at: now() });
}

/** What the page frame needs to know of whoever is at the screen. */
export async function viewSession({ db, settings }: AppContext, viewer: Viewer): Promise<SessionView> {
  const { name, currency, zone, age_limit: ageLimit } = await readImprint(db);
  return {
    user: viewer.person ? { ...viewer.person, roles: [...viewer.person.roles] } : null,
    tier: viewer.rank > 0 && viewer.membership ? { rank: viewer.rank, name: viewer.membership.tierName } : null,
    ageConfirmed: viewer.ageConfirmed,
    demo: settings.mode === 'demo',
    imprint: { name, currency, zone, ageLimit },
  };
}
