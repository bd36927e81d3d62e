import {
  demoAccounts,
  sessionView,
  type Credentials,
  type DemoAccounts,
  type SessionView,
} from '@shared/contracts/session.ts';
import { z } from 'zod';
import { request } from './request.ts';

const anything = z.unknown();

export async function fetchSession(): Promise<SessionView> {
  return (await request('GET', '/api/session', sessionView)).data;
}

export async function openSession(credentials: Credentials): Promise<void> {
  await request('POST', '/api/session', anything, { body: credentials });
}

export async function closeSession(): Promise<void> {
  await request('DELETE', '/api/session', anything);
}

/** Says that the reader has reached the imprint's age limit; the server remembers it. */
export async function confirmAge(): Promise<void> {
  await request('POST', '/api/session/age', anything, { body: { oldEnough: true } });
}

export async function fetchDemoAccounts(): Promise<DemoAccounts> {
  return (await request('GET', '/api/demo/accounts', demoAccounts)).data;
}
