import { describe, expect, inject, test } from 'vitest';
import type {} from '../harness/provided';
import { createDatabase, dropDatabase, requireLoopback, runSql } from '../harness/database';

describe('databases of the tests', () => {
  test.each([
    'postgres://a:b@db.example.org/x',
    'postgres://a:b@10.0.0.7:5432/x',
    'postgres://a:b@127.0.0.1.example.org/x',
  ])('%s is refused, as it is not on this machine', async (url) => {
    expect(() => requireLoopback(url)).toThrow('Tests use a database on 127.0.0.1 only');
    await expect(runSql(url, 'SELECT 1')).rejects.toThrow('Tests use a database on 127.0.0.1 only');
  });

  test('the one in use is on this machine', () => {
    expect(requireLoopback(inject('adminUrl'))).toBe(inject('adminUrl'));
  });

  test('a copy has what the template has, and only databases of the tests are dropped', async () => {
    const cluster = { adminUrl: inject('adminUrl'), template: inject('template') };
    const copy = await createDatabase(cluster);
    expect(await runSql(copy, 'SELECT count(*)::int AS number FROM migrations')).not.toEqual([{ number: 0 }]);
    await dropDatabase(cluster, copy);
    await expect(runSql(copy, 'SELECT 1')).rejects.toThrow('does not exist');
    await expect(dropDatabase(cluster, cluster.adminUrl)).rejects.toThrow('postgres is not a database of the tests.');
  });
});
