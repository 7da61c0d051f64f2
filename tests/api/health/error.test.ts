import { expect, test } from 'vitest';
import { get, post } from '../../harness/http';
import { clusterFromEnvironment, runSql } from '../../harness/database';
import { startServer } from '../../harness/server';
import { expectDescribed, expectProblem } from '../batteries/described';

/** Shuts a database: whoever is connected is thrown out, and nobody gets in. */
async function shut(databaseUrl: string): Promise<void> {
  const name = new URL(databaseUrl).pathname.slice(1);
  await runSql(
    clusterFromEnvironment().adminUrl,
    `ALTER DATABASE "${name}" WITH ALLOW_CONNECTIONS false`,
    `SELECT pg_terminate_backend(pid) FROM pg_stat_activity WHERE datname = '${name}'`,
  );
}

test('without its database the service is not well, and what counts towards a quota is not served', async () => {
  const server = await startServer({ COMPUTE_QUOTA_PER_MINUTE: '100' });
  try {
    const short = { field: 'Q', left: '[2]', right: '[2]' };
    expect((await post(`${server.url}/api/v1/compare`, short)).status).toBe(200);
    await shut(server.databaseUrl);

    const health = await get(`${server.url}/api/v1/health`);
    expect(health).toMatchObject({ status: 503, type: 'application/problem+json', body: { code: 'database' } });
    expect(health.text).not.toMatch(/postgres|5432|127\.0\.0\.1/);
    await expectDescribed('get', '/api/v1/health', health);

    const refused = await post(`${server.url}/api/v1/compare`, short);
    await expectProblem('/api/v1/compare', refused, 503, 'database');
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
  } finally {
    await server.stop();
  }
});
