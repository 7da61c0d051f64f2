import { afterAll, beforeAll, expect, test } from 'vitest';
import { closeDatabase } from '@/lib/database/connection';
import { linkCode } from '@/lib/links/code';
import { openLink, saveLink } from '@/lib/links/links';
import { runSql } from '../harness/database';
import { ownDatabase } from '../harness/own-database';

const url = ownDatabase();

beforeAll(() => {
  process.env.DATABASE_URL = url();
});
afterAll(closeDatabase);

test('a link opens the statement and the field that were kept', async () => {
  const code = await saveLink('Q_5', '[5][-5] = 0 ; char != 2');
  expect(code).toBe(linkCode('Q_5', '[5][-5] = 0 ; char != 2'));
  expect(await openLink(code)).toEqual({ field: 'Q_5', statement: '[5][-5] = 0 ; char != 2' });
});

test('keeping the same statement again, even at the same moment, gives the same link and one row', async () => {
  const codes = await Promise.all(Array.from({ length: 12 }, () => saveLink('F_7', '<2> = <1>')));
  expect(new Set(codes).size).toBe(1);
  const rows = await runSql(url(), `SELECT count(*)::int AS number FROM permalinks WHERE statement = '<2> = <1>'`);
  expect(rows).toEqual([{ number: 1 }]);
});

test('the same statement over another field is another link', async () => {
  expect(await saveLink('F_7', '[3] = 0')).not.toBe(await saveLink('F_11', '[3] = 0'));
});

test('a code that is taken by another statement is made longer, and both links stay', async () => {
  const taken = linkCode('R', '[-1]^2 = 0');
  await runSql(url(), `INSERT INTO permalinks (code, field, statement) VALUES ('${taken}', 'C', 'h = 2')`);
  const code = await saveLink('R', '[-1]^2 = 0');
  expect(code).toBe(linkCode('R', '[-1]^2 = 0', 11));
  expect(await openLink(taken)).toEqual({ field: 'C', statement: 'h = 2' });
  expect(await openLink(code)).toEqual({ field: 'R', statement: '[-1]^2 = 0' });
  expect(await saveLink('R', '[-1]^2 = 0')).toBe(code);
});

test('long statements and letters of every script are kept as they are', async () => {
  const statement = `${'⟨2⟩ + '.repeat(4000)}η[𝔽] = 0`;
  expect(await openLink(await saveLink('any', statement))).toEqual({ field: 'any', statement });
});

test('what the database cannot hold is kept with marks in its place', async () => {
  const code = await saveLink('Q', 'a\0b\ud800');
  expect(await openLink(code)).toEqual({ field: 'Q', statement: 'a\ufffdb\ufffd' });
  expect(await saveLink('Q', 'a\0b\ud800')).toBe(code);
});

test.each(['zzzzzzzzzz', '', 'x', "' OR 1=1 --"])('the unknown code %j opens nothing', async (code) => {
  expect(await openLink(code)).toBeUndefined();
});
