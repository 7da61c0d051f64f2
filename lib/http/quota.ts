import 'server-only';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { config } from '@/lib/config/config';
import { type Problem, problemOf } from '@/lib/contracts/problem';
import { database } from '@/lib/database/connection';

export interface QuotaOutcome {
  readonly headers: Readonly<Record<string, string>>;
  /** Why the request is not served, if it is not. */
  readonly problem?: Problem;
}

// Routes are bundled apart; what is remembered in memory about blocked addresses must be one memory.
const held = globalThis as typeof globalThis & { quadrelQuota?: RateLimiterPostgres };

function limiter(points: number): RateLimiterPostgres {
  held.quadrelQuota ??= new RateLimiterPostgres({
    storeClient: database(),
    storeType: 'sequelize',
    tableName: 'rate_limits',
    tableCreated: true,
    keyPrefix: 'compute',
    points,
    duration: 60,
    // An address that is past its quota is turned away from memory, without asking the database again.
    inMemoryBlockOnConsumed: points + 1,
  });
  return held.quadrelQuota;
}

/**
 * Counts `cost` computations for an address and says whether it may have them. When the database does not answer nothing is
 * served: a limit that fails open is none.
 */
export async function takeQuota(address: string, cost: number): Promise<QuotaOutcome> {
  const points = config().COMPUTE_QUOTA_PER_MINUTE;
  if (points === 0) return { headers: {} };
  if (cost > points)
    return {
      headers: { 'RateLimit-Limit': String(points), 'Retry-After': '60' },
      problem: problemOf(
        'quota',
        `This call counts as ${cost} questions, and ${points} a minute are free. Ask fewer at once.`,
      ),
    };
  try {
    const state = await limiter(points).consume(address, cost);
    return { headers: quotaHeaders(points, state) };
  } catch (state) {
    if (!(state instanceof RateLimiterRes))
      return { headers: {}, problem: problemOf('database', 'The quota cannot be read just now. Ask again shortly.') };
    const wait = Math.max(1, Math.ceil(state.msBeforeNext / 1000));
    return {
      headers: { ...quotaHeaders(points, state), 'RateLimit-Remaining': '0', 'Retry-After': String(wait) },
      problem: problemOf(
        'quota',
        `Too many questions from this address: ${points} a minute are free. Ask again in ${wait} ${wait === 1 ? 'second' : 'seconds'}.`,
      ),
    };
  }
}

const quotaHeaders = (points: number, { remainingPoints, msBeforeNext }: RateLimiterRes): Record<string, string> => ({
  'RateLimit-Limit': String(points),
  'RateLimit-Remaining': String(Math.max(0, remainingPoints)),
  'RateLimit-Reset': String(Math.max(0, Math.ceil(msBeforeNext / 1000))),
});
