import type { Knex } from 'knex';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { requestLimited } from './http.errors.ts';

/** Failures that are forgiven before a wait, per key; counted in PostgreSQL, so that every process agrees. */
const LIMITS = {
  /** One person's address from one place. */
  'sign-in': { points: 5, duration: 15 * 60 },
  /** Everything that one place tries. */
  'sign-in-place': { points: 50, duration: 15 * 60 },
  /** Letters that a stranger may have sent to one address. */
  'letter-to': { points: 5, duration: 60 * 60 },
  'letter-from-place': { points: 30, duration: 60 * 60 },
  token: { points: 20, duration: 15 * 60 },
} as const;
export type LimitName = keyof typeof LIMITS;

function limiter(db: Knex, name: LimitName): RateLimiterPostgres {
  return new RateLimiterPostgres({
    storeClient: db,
    storeType: 'knex',
    tableName: 'failure_limits',
    tableCreated: true,
    clearExpiredByTimeout: false,
    keyPrefix: name,
    ...LIMITS[name],
  });
}

/** Refuses when this key has used up its failures. */
export async function refuseWhenLimited(db: Knex, name: LimitName, key: string): Promise<void> {
  const state = await limiter(db, name).get(key);
  if (state && state.consumedPoints >= LIMITS[name].points) throw limited(state);
}

/** Counts one failure, or one letter. */
export async function countFailure(db: Knex, name: LimitName, key: string): Promise<void> {
  try {
    await limiter(db, name).consume(key);
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error;
  }
}

/** Counts, and refuses once the allowance is used up. */
export async function spend(db: Knex, name: LimitName, key: string): Promise<void> {
  try {
    await limiter(db, name).consume(key);
  } catch (error) {
    if (error instanceof RateLimiterRes) throw limited(error);
    throw error;
  }
}

export async function forgetFailures(db: Knex, name: LimitName, key: string): Promise<void> {
  await limiter(db, name).delete(key);
}

function limited(state: RateLimiterRes) {
  const seconds = Math.max(1, Math.ceil(state.msBeforeNext / 1000));
  return requestLimited({ headers: { 'Retry-After': String(seconds) }, context: { seconds } });
}
