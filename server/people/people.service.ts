import type { Knex } from 'knex';
import type { AppContext } from '../context.ts';
import type { Registration } from '../../shared/contracts/people.ts';
import { queueLetter } from '../letters/letters.ts';
import { emailTaken, personNotFound, wrongPassword } from './people.errors.ts';
import {
  deleteSessionsOf,
  deleteTokensOf,
  findPerson,
  findPersonByEmail,
  insertPerson,
  updatePerson,
} from './people.queries.ts';
import type { PersonRow } from './people.rows.ts';
import { hashPassword, verifyPassword } from './passwords.ts';
import { makeToken, useToken } from './tokens.ts';

/**
 * Makes an account and writes the letter that confirms its address. Age said before is remembered with it.
 */
export async function register(ctx: AppContext, draft: Registration, ageConfirmed: boolean): Promise<PersonRow> {
  const passwordHash = await hashPassword(draft.password);
  return ctx.db.transaction(async (trx) => {
    const person = await insertPerson(trx, {
      email: draft.email,
      name: draft.name,
      password_hash: passwordHash,
      age_confirmed_at: ageConfirmed ? ctx.now() : null,
    });
    await sendVerification(ctx, trx, person);
    return person;
  });
}

/** Writes the confirming letter once more; nothing happens where the address is confirmed already. */
export async function resendVerification(ctx: AppContext, personId: string): Promise<void> {
  await ctx.db.transaction(async (trx) => {
    const person = await readPerson(trx, personId);
    if (!person.verified_at) await sendVerification(ctx, trx, person);
  });
}

async function sendVerification(ctx: AppContext, trx: Knex, person: PersonRow): Promise<void> {
  const token = await makeToken(trx, { personId: person.id, purpose: 'verify', now: ctx.now() });
  const link = `${ctx.settings.publicUrl}/verify?token=${token}`;
  await queueLetter(trx, {
    kind: 'verify',
    to: person.email,
    personId: person.id,
    fields: { name: person.name, link },
  });
}

/** Confirms the address that a letter went to. */
export async function verifyEmail(ctx: AppContext, token: string): Promise<void> {
  await ctx.db.transaction(async (trx) => {
    const { person_id: personId } = await useToken(trx, token, 'verify', ctx.now());
    await updatePerson(trx, personId, { verified_at: ctx.now() });
  });
}

/** Writes a letter with a link to a new password, if there is such an account; the answer never tells. */
export async function forgotPassword(ctx: AppContext, email: string): Promise<void> {
  await ctx.db.transaction(async (trx) => {
    const person = await findPersonByEmail(trx, email);
    if (!person) return;
    const token = await makeToken(trx, { personId: person.id, purpose: 'reset', now: ctx.now() });
    const link = `${ctx.settings.publicUrl}/reset?token=${token}`;
    await queueLetter(trx, {
      kind: 'reset',
      to: person.email,
      personId: person.id,
      fields: { name: person.name, link },
    });
  });
}

/** Sets a new password by a letter's link: the address is proven by it, and every session ends. */
export async function resetPassword(ctx: AppContext, token: string, password: string): Promise<void> {
  const passwordHash = await hashPassword(password);
  await ctx.db.transaction(async (trx) => {
    const { person_id: personId } = await useToken(trx, token, 'reset', ctx.now());
    const person = await readPerson(trx, personId);
    await updatePerson(trx, personId, { password_hash: passwordHash, verified_at: person.verified_at ?? ctx.now() });
    await deleteSessionsOf(trx, personId, null);
  });
}

/** Changes the password of somebody who knows the present one; their other sessions end. */
export async function changePassword(
  ctx: AppContext,
  { personId, current, password, sid }: { personId: string; current: string; password: string; sid: string },
): Promise<void> {
  const person = await readPerson(ctx.db, personId);
  await checkPassword(person, current);
  const passwordHash = await hashPassword(password);
  await ctx.db.transaction(async (trx) => {
    await updatePerson(trx, personId, { password_hash: passwordHash });
    await deleteTokensOf(trx, personId, 'reset');
    await deleteSessionsOf(trx, personId, sid);
  });
}

/** Asks the new address to confirm itself and tells the old one; nothing changes before the link is followed. */
export async function startEmailChange(
  ctx: AppContext,
  { personId, email, password }: { personId: string; email: string; password: string },
): Promise<void> {
  const person = await readPerson(ctx.db, personId);
  await checkPassword(person, password);
  await ctx.db.transaction(async (trx) => {
    if (await findPersonByEmail(trx, email)) throw emailTaken();
    const token = await makeToken(trx, { personId, purpose: 'change-email', now: ctx.now(), newEmail: email });
    const link = `${ctx.settings.publicUrl}/confirm-email?token=${token}`;
    const { name } = person;
    await queueLetter(trx, { kind: 'email-change', to: email, personId, fields: { name, link, newEmail: email } });
    await queueLetter(trx, { kind: 'email-changing', to: person.email, personId, fields: { name, newEmail: email } });
  });
}

/** Changes the address by the letter's link and tells both addresses. */
export async function confirmEmailChange(ctx: AppContext, token: string): Promise<void> {
  await ctx.db.transaction(async (trx) => {
    const { person_id: personId, new_email: newEmail } = await useToken(trx, token, 'change-email', ctx.now());
    const before = await readPerson(trx, personId);
    const email = newEmail!;
    await updatePerson(trx, personId, { email, verified_at: ctx.now() });
    await deleteTokensOf(trx, personId, 'reset');
    const fields = { name: before.name, oldEmail: before.email, newEmail: email };
    for (const to of [before.email, email]) await queueLetter(trx, { kind: 'email-changed', to, personId, fields });
  });
}

export async function changeName(ctx: AppContext, personId: string, name: string): Promise<void> {
  await updatePerson(ctx.db, personId, { name });
}

async function readPerson(db: Knex, id: string): Promise<PersonRow> {
  const person = await findPerson(db, id);
  if (!person) throw personNotFound();
  return person;
}

async function checkPassword(person: PersonRow, password: string): Promise<void> {
  if (!(await verifyPassword(person.password_hash, password))) throw wrongPassword();
}
