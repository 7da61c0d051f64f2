import 'server-only';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { database } from '@/lib/database/connection';

/** What is counted against guessing and flooding, by whom, and how often it may happen in how many seconds. */
const limits = {
  'sign-in-account': { points: 8, duration: 15 * 60 },
  'sign-in-address': { points: 60, duration: 15 * 60 },
  'reset-account': { points: 3, duration: 60 * 60 },
  'reset-address': { points: 20, duration: 60 * 60 },
  'start-address': { points: 20, duration: 60 * 60 },
  'link-address': { points: 60, duration: 15 * 60 },
  'invite-group': { points: 60, duration: 60 * 60 },
} as const;
export type Limit = keyof typeof limits;

// Routes are bundled apart and each would make its own.
const held = globalThis as typeof globalThis & { quadrelThrottles?: Map<Limit, RateLimiterPostgres> };

function limiter(limit: Limit): RateLimiterPostgres {
  held.quadrelThrottles ??= new Map();
  let made = held.quadrelThrottles.get(limit);
  if (made === undefined) {
    made = new RateLimiterPostgres({
      storeClient: database(),
      storeType: 'sequelize',
      tableName: 'rate_limits',
      tableCreated: true,
      keyPrefix: limit,
      ...limits[limit],
    });
    held.quadrelThrottles.set(limit, made);
  }
  return made;
}

/** Counts one attempt. Seconds to wait when there were too many, else undefined. Throws when the database does not answer. */
export async function attempt(limit: Limit, key: string): Promise<number | undefined> {
  try {
    await limiter(limit).consume(key.slice(0, 200));
    return undefined;
  } catch (state) {
    if (!(state instanceof RateLimiterRes)) throw state;
    return Math.max(1, Math.ceil(state.msBeforeNext / 1000));
  }
}

/** Forgets the attempts under a key: whoever knows the password did not guess. */
export async function forgive(limit: Limit, key: string): Promise<void> {
  await limiter(limit).delete(key.slice(0, 200));
}

/** Takes one counted attempt back: it turned out to be none of those that are to be few. */
export async function giveBack(limit: Limit, key: string): Promise<void> {
  await limiter(limit).reward(key.slice(0, 200));
}
