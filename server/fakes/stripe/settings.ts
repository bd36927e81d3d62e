import { z } from 'zod';

const LOOPBACK = new Set(['127.0.0.1', 'localhost', '[::1]']);

/** Whether a `Host` header or the host of an address means this machine. */
export function isLoopback(host: string): boolean {
  return LOOPBACK.has(host.replace(/:\d+$/, ''));
}

const environment = z.object({
  FAKE_STRIPE_PORT: z.coerce.number().int().min(0).max(65_535),
  DATABASE_URL: z.string().min(1),
  STRIPE_WEBHOOK_SECRET: z.string().min(1),
  WEBHOOK_URL: z.url().refine((url) => isLoopback(new URL(url).hostname), 'must be an address of this machine'),
});

export interface FakeSettings {
  /** 0 takes any free port. */
  port: number;
  databaseUrl: string;
  webhook: { url: string; secret: string };
}

/** Reads the fake's settings; throws one sentence per wrong or missing one. */
export function readFakeSettings(env: NodeJS.ProcessEnv): FakeSettings {
  const result = environment.safeParse(env);
  if (!result.success) throw new Error(`Wrong settings of the payment fake:\n${z.prettifyError(result.error)}`);
  const { FAKE_STRIPE_PORT, DATABASE_URL, STRIPE_WEBHOOK_SECRET, WEBHOOK_URL } = result.data;
  return {
    port: FAKE_STRIPE_PORT,
    databaseUrl: DATABASE_URL,
    webhook: { url: WEBHOOK_URL, secret: STRIPE_WEBHOOK_SECRET },
  };
}
