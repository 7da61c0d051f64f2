import { randomBytes } from 'node:crypto';
import pg from 'pg';

/** The throw-away cluster the test command made. */
export interface Cluster {
  readonly adminUrl: string;
  readonly template: string;
}

/** The cluster named in the environment. Refuses any database that is not on this machine: tests drop what they find. */
export function clusterFromEnvironment(): Cluster {
  const adminUrl = process.env.QUADREL_TEST_ADMIN_URL;
  const template = process.env.QUADREL_TEST_TEMPLATE;
  if (adminUrl === undefined || template === undefined) {
    throw new Error(
      'These tests need a throw-away database. Run them by npm test, npm run test:database, test:api or test:browser.',
    );
  }
  return { adminUrl: requireLoopback(adminUrl), template };
}

/** Returns the address when its host is this machine's loopback; throws otherwise. */
export function requireLoopback(url: string): string {
  const { hostname } = new URL(url);
  if (hostname === '127.0.0.1' || hostname === '[::1]' || hostname === 'localhost') return url;
  throw new Error(`Tests use a database on 127.0.0.1 only, not on ${hostname}.`);
}

/** Runs statements on one connection and returns the rows of the last. */
export async function runSql(url: string, ...statements: string[]): Promise<Record<string, unknown>[]> {
  const client = new pg.Client({ connectionString: requireLoopback(url) });
  await client.connect();
  try {
    let rows: Record<string, unknown>[] = [];
    for (const statement of statements) rows = (await client.query<Record<string, unknown>>(statement)).rows;
    return rows;
  } finally {
    await client.end();
  }
}

/** A database of one's own: a copy of the template, or an empty one. */
export async function createDatabase(cluster: Cluster, options: { empty?: boolean } = {}): Promise<string> {
  const name = `test_${randomBytes(6).toString('hex')}`;
  const template = options.empty === true ? 'template0' : cluster.template;
  await runSql(cluster.adminUrl, `CREATE DATABASE "${name}" TEMPLATE "${template}"`);
  const url = new URL(cluster.adminUrl);
  url.pathname = `/${name}`;
  return url.href;
}

/** Drops a database that `createDatabase` made, whoever is still connected to it. */
export async function dropDatabase(cluster: Cluster, url: string): Promise<void> {
  const name = new URL(url).pathname.slice(1);
  if (!name.startsWith('test_')) throw new Error(`${name} is not a database of the tests.`);
  await runSql(cluster.adminUrl, `DROP DATABASE IF EXISTS "${name}" WITH (FORCE)`);
}
