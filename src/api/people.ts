import type { Registration } from '@shared/contracts/people.ts';
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
