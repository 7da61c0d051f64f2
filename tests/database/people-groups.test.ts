import { afterAll, beforeAll, expect, test } from 'vitest';
import { closeDatabase } from '@/lib/database/connection';
import { checkPassword } from '@/lib/people/sign-in';
import { isRefused } from '@/lib/people/refused';
import { seatsOf } from '@/lib/people/seats';
import { startGroup } from '@/lib/people/start-group';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember, query } from '../harness/people';

const url = ownDatabase();
const password = 'granite and lichen';

beforeAll(() => {
  process.env.DATABASE_URL = url();
});
afterAll(closeDatabase);

const founder = (email: string) => ({ name: 'Odile Farrant', email, password });
const group = (slug: string) => ({ name: 'Skerry seminar', slug });
const count = async (sql: string, ...values: unknown[]) => (await query(url(), sql, values)).length;

test('a group is started with an account, its first steward, and a line in what happened', async () => {
  const started = await startGroup(group('skerry-one'), founder('odile@skerry.example'), '192.0.2.1');
  if (isRefused(started)) throw new Error(started.refused);
  expect(await seatsOf(started.userId)).toMatchObject([
    { name: 'Skerry seminar', slug: 'skerry-one', role: 'steward' },
  ]);
  expect(await checkPassword(' Odile@Skerry.example ', password, '192.0.2.1')).toMatchObject({
    outcome: 'right',
    id: started.userId,
    version: started.sessionVersion,
  });
  expect(
    await query(url(), `SELECT actor_name, action, subject FROM audit_events WHERE actor_id = $1`, [started.userId]),
  ).toEqual([{ actor_name: 'Odile Farrant', action: 'group-started', subject: 'Skerry seminar' }]);
  const [row] = await query<{ password_hash: string }>(url(), 'SELECT password_hash FROM users WHERE id = $1', [
    started.userId,
  ]);
  expect(row?.password_hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
});

test('someone with an account starts another group, and is in both', async () => {
  const member = await newMember(await newGroup(url()), 'reader', { url: url() });
  const started = await startGroup(group('second-one'), member.person, '192.0.2.1');
  expect(isRefused(started)).toBe(false);
  expect((await seatsOf(member.person.id)).map(({ role }) => role).sort()).toEqual(['reader', 'steward']);
});

test('a taken short name is refused at its field, with one that is free, and leaves nothing behind', async () => {
  await startGroup(group('taken'), founder('first@skerry.example'), '192.0.2.1');
  await startGroup(group('taken-b'), founder('second@skerry.example'), '192.0.2.1');
  const refused = await startGroup(group('taken'), founder('third@skerry.example'), '192.0.2.1');
  expect(refused).toEqual({ refused: 'Another group is called “taken”. “taken-c” is free.', field: 'slug' });
  expect(await count('SELECT 1 FROM users WHERE email = $1', 'third@skerry.example')).toBe(0);
});

test('an address with an account is refused, and no group is left behind', async () => {
  await startGroup(group('before'), founder('here@skerry.example'), '192.0.2.1');
  const refused = await startGroup(group('after'), founder('here@skerry.example'), '192.0.2.1');
  expect(refused).toMatchObject({ field: 'email' });
  expect(await count('SELECT 1 FROM groups WHERE slug = $1', 'after')).toBe(0);
});

test('of two who start a group under one short name at the same moment, one does', async () => {
  const outcomes = await Promise.all(
    ['a', 'b', 'c'].map((name) => startGroup(group('raced'), founder(`raced-${name}@skerry.example`), '192.0.2.1')),
  );
  expect(outcomes.filter((outcome) => !isRefused(outcome))).toHaveLength(1);
  expect(await count('SELECT 1 FROM groups WHERE slug = $1', 'raced')).toBe(1);
  expect(await count("SELECT 1 FROM users WHERE email LIKE 'raced-%'")).toBe(1);
});

test('starts from one address are counted', async () => {
  const starts = [];
  for (let index = 0; index < 21; index += 1) {
    // Refused for its short name, but an attempt all the same.
    starts.push(await startGroup(group('taken'), { id: 'nobody', name: 'Nobody' }, '192.0.2.99').catch(() => 'failed'));
  }
  expect(starts.slice(0, 20)).not.toContainEqual(
    expect.objectContaining({ refused: expect.stringMatching(/^Too many/) }),
  );
  expect(starts[20]).toMatchObject({ refused: expect.stringMatching(/^Too many attempts\. Try again in \d+ seconds/) });
  expect(await startGroup(group('elsewhere'), founder('elsewhere@skerry.example'), '192.0.2.98')).toMatchObject({
    slug: 'elsewhere',
  });
});
