import { expect, test } from 'vitest';
import { seed } from '@/lib/database/migrate.mjs';
import { linkCode } from '@/lib/links/code';
import { runSql } from '../harness/database';
import { ownDatabase } from '../harness/own-database';

const url = ownDatabase();
const rows = () => runSql(url(), 'SELECT code, field, statement, created_at FROM permalinks ORDER BY code');

test('the seeded links have the codes the program itself gives', async () => {
  const seeded = await rows();
  expect(seeded.length).toBeGreaterThan(0);
  for (const { code, field, statement } of seeded) expect(code).toBe(linkCode(String(field), String(statement)));
});

test('seeding twice changes nothing, and keeps what people added', async () => {
  await runSql(url(), `INSERT INTO permalinks (code, field, statement) VALUES ('0000000000', 'Q', '[3] = [3]')`);
  const before = await rows();
  await seed(url());
  await seed(url());
  expect(await rows()).toEqual(before);
});
