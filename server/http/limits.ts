// Limits on how often something may be done, counted in the database so that all servers count together.
import { createHash } from 'node:crypto';
import type { Pool } from 'pg';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { ApiError } from './api-error';

const KINDS = {
  /** Sign-ins for one account, from wherever. */
  signIn: { points: 20, seconds: 15 * 60 },
  /** Mails to one address: resets, verifications, invitations. */
  mailTo: { points: 10, seconds: 60 * 60 },
  /** Invitations that one person sends. */
  invite: { points: 60, seconds: 60 * 60 },
  /** Uploads by one person. */
  upload: { points: 120, seconds: 60 * 60 },
  /** Pictures by one person: a dry fit brings up to two dozen at once. */
  picture: { points: 600, seconds: 60 * 60 },
  /** Public share reads from one address. */
  share: { points: 600, seconds: 60 },
} as const;
export type LimitKind = keyof typeof KINDS;

export interface Limits {
  /** Counts one use; throws `rate/limited` when there were too many. */
  readonly use: (kind: LimitKind, key: string) => Promise<void>;
}

/** What is counted is a hash: the table holds no addresses. */
const hashed = (key: string): string => createHash('sha256').update(key).digest('hex').slice(0, 40);

export function createLimits(pool: Pool, factor = 1): Limits {
  const limiters = Object.fromEntries(
    Object.entries(KINDS).map(([kind, { points, seconds }]) => [
      kind,
      new RateLimiterPostgres({
        storeClient: pool,
        storeType: 'client',
        tableName: 'limit_points',
        tableCreated: true,
        keyPrefix: kind,
        points: points * factor,
        duration: seconds,
        // no timer of its own: old rows are swept by a job
        clearExpiredByTimeout: false,
      }),
    ]),
  ) as Record<LimitKind, RateLimiterPostgres>;
  return {
    async use(kind, key) {
      try {
        await limiters[kind].consume(hashed(key));
      } catch (error) {
        if (!(error instanceof RateLimiterRes)) throw error;
        throw new ApiError('rate/limited', { data: { seconds: Math.ceil(error.msBeforeNext / 1000) } });
      }
    },
  };
}
