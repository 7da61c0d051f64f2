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
const held = globalThis as typeof globalThis & { quadrelQuota?: Map<Counted, RateLimiterPostgres> };

/** Whose questions are counted together. */
type Counted = 'address' | 'token';

function limiter(counted: Counted, points: number): RateLimiterPostgres {
  held.quadrelQuota ??= new Map();
  const known = held.quadrelQuota.get(counted);
  if (known !== undefined) return known;
  const made = new RateLimiterPostgres({
    storeClient: database(),
    storeType: 'sequelize',
    tableName: 'rate_limits',
    tableCreated: true,
    keyPrefix: counted === 'address' ? 'compute' : 'compute-token',
    points,
    duration: 60,
    // An address that is past its quota is turned away from memory, without asking the database again.
    inMemoryBlockOnConsumed: points + 1,
  });
  held.quadrelQuota.set(counted, made);
  return made;
}

/**
 * Counts `cost` computations for a token, or for an address where there is none, and says whether it may have them. When the
 * database does not answer nothing is served: a limit that fails open is none.
 */
export async function takeQuota(address: string, token: string | undefined, cost: number): Promise<QuotaOutcome> {
  const counted = token === undefined ? 'address' : 'token';
  const { COMPUTE_QUOTA_PER_MINUTE, TOKEN_QUOTA_PER_MINUTE } = config();
  const points = counted === 'address' ? COMPUTE_QUOTA_PER_MINUTE : TOKEN_QUOTA_PER_MINUTE;
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
    const state = await limiter(counted, points).consume(token ?? address, cost);
    return { headers: quotaHeaders(points, state) };
  } catch (state) {
    if (!(state instanceof RateLimiterRes))
      return { headers: {}, problem: problemOf('database', 'The quota cannot be read just now. Ask again shortly.') };
    const wait = Math.max(1, Math.ceil(state.msBeforeNext / 1000));
    return {
      headers: { ...quotaHeaders(points, state), 'RateLimit-Remaining': '0', 'Retry-After': String(wait) },
      problem: problemOf(
        'quota',
        `Too many questions from this ${counted}: ${points} a minute are free. Ask again in ${wait} ${wait === 1 ? 'second' : 'seconds'}.`,
      ),
    };
  }
}

const quotaHeaders = (points: number, { remainingPoints, msBeforeNext }: RateLimiterRes): Record<string, string> => ({
  'RateLimit-Limit': String(points),
  'RateLimit-Remaining': String(Math.max(0, remainingPoints)),
  'RateLimit-Reset': String(Math.max(0, Math.ceil(msBeforeNext / 1000))),
});
