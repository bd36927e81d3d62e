import { z } from 'zod';

const given = z.string({ error: 'is missing' });
const port = z.coerce.number().int().min(0).max(65_535);

const environment = z.object({
  MODE: z.enum(['demo', 'production', 'test']).default('production'),
  HOST: z.string().default('127.0.0.1'),
  PORT: port.default(8080),
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/, error: 'must be a postgresql:// address' }),
  DATA_DIR: z.string().min(1).default('.data'),
  SESSION_SECRET: given.min(32, 'must have at least 32 characters'),
  STRIPE_SECRET_KEY: given.regex(/^(sk|rk)_/, 'must be a secret key of the payment service (sk_…)'),
  STRIPE_WEBHOOK_SECRET: given.regex(/^whsec_/, 'must be a signing secret (whsec_…)'),
  STRIPE_API_BASE: z.url({ protocol: /^https?$/ }).optional(),
  SMTP_URL: z.url({ protocol: /^smtps?$/, error: 'must be an smtp:// or smtps:// address' }),
  LETTERS_URL: z.url({ protocol: /^http$/ }).optional(),
  LETTERS_FROM: z.string().min(3).optional(),
  PUBLIC_URL: z.url({ protocol: /^https?$/, error: 'must be the http(s):// address people type' }),
});

export type Settings = ReturnType<typeof readSettings>;

/** Reads and checks every setting once, at start. Nothing else in the server reads `process.env`. */
export function readSettings(env: NodeJS.ProcessEnv = process.env) {
  const result = environment.safeParse(env);
  if (!result.success) throw new Error(wordFaults(result.error));
  const set = result.data;
  if (set.MODE === 'production' && (set.STRIPE_API_BASE || set.LETTERS_URL))
    throw new Error('STRIPE_API_BASE and LETTERS_URL belong to the demonstration and must not be set in production.');

  const publicUrl = new URL(set.PUBLIC_URL);
  return {
    mode: set.MODE,
    http: { host: set.HOST, port: set.PORT },
    /** Without a slash at the end. */
    publicUrl: publicUrl.origin,
    secureCookies: publicUrl.protocol === 'https:',
    database: { url: set.DATABASE_URL },
    dataDir: set.DATA_DIR,
    session: { secret: set.SESSION_SECRET },
    stripe: {
      secretKey: set.STRIPE_SECRET_KEY,
      webhookSecret: set.STRIPE_WEBHOOK_SECRET,
      apiBase: set.STRIPE_API_BASE ? new URL(set.STRIPE_API_BASE) : null,
    },
    mail: {
      url: set.SMTP_URL,
      from: set.LETTERS_FROM ?? `letters@${publicUrl.hostname}`,
      caughtAt: set.LETTERS_URL ?? null,
    },
  };
}

function wordFaults(error: z.ZodError): string {
  const lines = error.issues.map((issue) => `  ${issue.path.join('.')} ${issue.message}`);
  return `These settings are missing or wrong:\n${lines.join('\n')}`;
}
