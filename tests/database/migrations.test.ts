import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { migrate, rollBack } from '@/lib/database/migrate.mjs';
import { runSql } from '../harness/database';
import { ownDatabase } from '../harness/own-database';
import { describeSchema } from './describe-schema';

const url = ownDatabase({ empty: true });
const files = readdirSync(path.resolve(import.meta.dirname, '../../migrations')).sort();
const golden = readFileSync(path.join(import.meta.dirname, 'schema.golden.txt'), 'utf8');

const tables = async () =>
  (await runSql(url(), `SELECT tablename FROM pg_tables WHERE schemaname = 'public' ORDER BY 1`)).map(
    (row) => row.tablename,
  );

test('the migrations run in order, once, and make the schema of schema.golden.txt', async () => {
  expect(await migrate(url())).toEqual(files);
  expect(await migrate(url())).toEqual([]);
  expect(await describeSchema(url())).toBe(golden);
});

test('every migration is undone, the newest first, and nothing is left but the list of migrations', async () => {
  expect(await rollBack(url())).toEqual([...files].reverse());
  expect(await tables()).toEqual(['migrations']);
  expect(await runSql(url(), `SELECT to_regnamespace('graphile_worker') AS queue`)).toEqual([{ queue: null }]);
});

test('they can be run again after that', async () => {
  expect(await migrate(url())).toEqual(files);
  expect(await describeSchema(url())).toBe(golden);
});

test('two servers that migrate at the same time do not disturb each other', async () => {
  await rollBack(url());
  const both = await Promise.all([migrate(url()), migrate(url())]);
  expect(both.flat().sort()).toEqual(files);
  expect(await describeSchema(url())).toBe(golden);
});
