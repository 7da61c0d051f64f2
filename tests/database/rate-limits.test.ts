import { afterAll, beforeAll, expect, test } from 'vitest';
import { RateLimiterPostgres } from 'rate-limiter-flexible';
import { closeDatabase, database } from '@/lib/database/connection';
import { ownDatabase } from '../harness/own-database';

const url = ownDatabase();

beforeAll(() => {
  process.env.DATABASE_URL = url();
});
afterAll(closeDatabase);

test('the table of the migration is the one the rate limiter works with', async () => {
  const limiter = new RateLimiterPostgres({
    storeClient: database(),
    storeType: 'sequelize',
    tableName: 'rate_limits',
    tableCreated: true,
    clearExpiredByTimeout: false,
    points: 2,
    duration: 60,
  });
  expect((await limiter.consume('192.0.2.1')).remainingPoints).toBe(1);
  expect((await limiter.consume('192.0.2.1')).remainingPoints).toBe(0);
  await expect(limiter.consume('192.0.2.1')).rejects.toMatchObject({ remainingPoints: 0 });
  expect((await limiter.consume('192.0.2.2')).remainingPoints).toBe(1);
});
