import { personList, personRow, type PersonRow, type Registration } from '@shared/contracts/people.ts';
import type { Role } from '@shared/contracts/words.ts';
import { z } from 'zod';
import { request } from './request.ts';

const anything = z.unknown();

export async function register(registration: Registration): Promise<void> {
  await request('POST', '/api/people/register', anything, { body: registration });
}

export async function verifyEmail(token: string): Promise<void> {
  await request('POST', '/api/people/verify', anything, { body: { token } });
}

export async function resendVerification(): Promise<void> {
  await request('POST', '/api/people/verify/resend', anything);
}

export async function askForReset(email: string): Promise<void> {
  await request('POST', '/api/people/forgot', anything, { body: { email } });
}

export async function resetPassword(token: string, password: string): Promise<void> {
  await request('POST', '/api/people/reset', anything, { body: { token, password } });
}

export async function confirmEmail(token: string): Promise<void> {
  await request('POST', '/api/people/confirm-email', anything, { body: { token } });
}

export async function changeName(name: string): Promise<void> {
  await request('PUT', '/api/account/name', anything, { body: { name } });
}

export async function changePassword(change: { current: string; password: string }): Promise<void> {
  await request('PUT', '/api/account/password', anything, { body: change });
}

/** Asks the new address to confirm itself; the old one stays until then. */
export async function startEmailChange(change: { email: string; password: string }): Promise<void> {
  await request('POST', '/api/account/email', anything, { body: change });
}

export type PersonList = z.infer<typeof personList>;

/** A page of the people of the house, newest first. Pages count from 1. */
export async function fetchPeople(query: { find: string; role: Role | ''; page: number }): Promise<PersonList> {
  return (await request('GET', '/api/office/people', personList, { query })).data;
}

/** Gives and takes roles. @throws ApiProblem `request.version_conflict` when somebody else changed the person. */
export async function changeRoles(person: Pick<PersonRow, 'id' | 'version'>, roles: Role[]): Promise<PersonRow> {
  const path = `/api/office/people/${person.id}/roles`;
  return (await request('PUT', path, personRow, { body: { roles }, ifMatch: `"${person.version}"` })).data;
}
