import fs from 'node:fs';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { closeDatabase, database } from '@/lib/database/connection';
import { seed } from '@/lib/database/migrate.mjs';
import { identityContent } from '@/lib/contracts/identity-content';
import type { Member } from '@/lib/people/caller';
import { isPassword } from '@/lib/people/passwords';
import { seatsOf } from '@/lib/people/seats';
import { exportIdentities } from '@/lib/register/export';
import { openIdentity } from '@/lib/register/open';
import { vectorSql } from '@/lib/register/store';
import { demoPassword } from '@/seeders/0002-demo.mjs';
import { computeDemo, type Computed, readStory, recordedFile } from '../demo/compute';
import { runSql } from '../harness/database';
import { ownDatabase } from '../harness/own-database';

const url = ownDatabase();
const story = readStory();

beforeAll(async () => {
  process.env.DATABASE_URL = url();
  await seed(url(), { demo: true });
});
afterAll(closeDatabase);

const everything = () =>
  Promise.all(
    ['users', 'groups', 'memberships', 'identities', 'revisions', 'checks', 'audit_events', 'permalinks'].map((table) =>
      runSql(url(), `SELECT * FROM ${table} ORDER BY 1, 2`),
    ),
  );

async function memberNamed(name: string, slug = 'skerry'): Promise<Member> {
  const [user] = await runSql(url(), `SELECT id, name, email FROM users WHERE name = '${name}'`);
  const person = user as unknown as Member['person'];
  const group = (await seatsOf(person.id)).find((seat) => seat.slug === slug);
  if (group === undefined) throw new Error(`${name} is not in ${slug}.`);
  return { kind: 'member', person, group };
}

test('what is recorded of the engine is what this engine says', async () => {
  const recorded = JSON.parse(fs.readFileSync(recordedFile, 'utf8')) as Record<string, Computed>;
  const withoutTime = (all: Record<string, Computed>): unknown =>
    JSON.parse(JSON.stringify(all, (key, value: unknown) => (key === 'durationMs' ? undefined : value)));
  expect(withoutTime(recorded)).toEqual(withoutTime(await computeDemo()));
});

test('every text of the demo could have been written into the forms', () => {
  for (const { identities } of story)
    for (const { revisions } of identities)
      for (const { content } of revisions) expect(identityContent.safeParse(content).error).toBeUndefined();
});

test('seeding twice does no harm, and adds nothing where somebody has an account', async () => {
  const before = await everything();
  await seed(url(), { demo: true });
  expect(await everything()).toEqual(before);
  await runSql(url(), `DELETE FROM groups WHERE slug = 'tarn'`);
  const changed = await everything();
  await seed(url(), { demo: true });
  expect(await everything()).toEqual(changed);
});

test('everyone can sign in with the password of the README, and has the role it names', async () => {
  const people = await runSql(
    url(),
    `SELECT u.name, u.email, u.password_hash, m.role FROM users u
       JOIN memberships m ON m.user_id = u.id JOIN groups g ON g.id = m.group_id AND g.slug = 'skerry'
      ORDER BY u.name`,
  );
  const readme = fs.readFileSync('README.md', 'utf8');
  expect(readme).toContain(demoPassword);
  expect(people.map(({ name }) => name)).toEqual(['Ines Calloway', 'Maren Iwuji', 'Odile Farrant', 'Tobias Renk']);
  for (const { email, role, password_hash } of people) {
    expect(readme).toMatch(new RegExp(`${String(email)}.*${String(role)}`));
    expect(await isPassword(demoPassword, String(password_hash))).toBe(true);
    expect(String(password_hash)).toMatch(/^\$argon2id\$/);
  }
  expect(new Set(people.map(({ password_hash }) => password_hash)).size).toBe(4);
});

test('the register shows the identities in the states that their checks give', async () => {
  const reader = await memberNamed('Ines Calloway');
  const states: Record<string, [string, string | undefined]> = {};
  const file = await exportIdentities(reader, { format: 'json' });
  if (!('answer' in file)) throw new Error(file.problem.detail);
  let text = '';
  for await (const chunk of file.answer.chunks) text += chunk;
  const { identities } = JSON.parse(text) as {
    identities: { key: string; state: string; lastCheck?: { verdict: string } }[];
  };
  for (const { key, state, lastCheck } of identities) states[key] = [state, lastCheck?.verdict];
  expect(states).toEqual({
    ...Object.fromEntries(Array.from({ length: 12 }, (_, index) => [`skerry-${index + 1}`, ['checked', 'equal']])),
    'skerry-7': ['withdrawn', 'different'],
    'skerry-12': ['checked', 'different'],
    'skerry-13': ['draft', 'undecided'],
  });
});

test('each page has its revisions, its evidence and its words', async () => {
  const author = await memberNamed('Tobias Renk');
  const opened = await openIdentity(author, 'skerry-9', 2);
  expect(opened).toMatchObject({
    revision: 2,
    current: 3,
    keeper: 'Tobias Renk',
    revisions: [{ number: 3 }, { number: 2 }, { number: 1 }],
    evidence: { compare: { verdict: 'equal' } },
  });
  const recorded = JSON.parse(fs.readFileSync(recordedFile, 'utf8')) as Record<string, Computed>;
  for (const [number, { words }] of Object.entries(recorded)
    .filter(([key]) => key.startsWith('skerry-'))
    .map(([key, value]) => [Number(key.slice(7)), value] as const)) {
    const [rows] = await database().query(
      `SELECT i.words = ${vectorSql(2)} AS same FROM identities i JOIN groups g ON g.id = i.group_id
        WHERE g.slug = 'skerry' AND i.number = $1`,
      { bind: [number, ...words] },
    );
    expect(rows, `skerry-${number}`).toEqual([{ same: true }]);
  }
});

test('without being asked for, and beside anyone who has an account, there is no demo', async () => {
  const people = () => runSql(url(), 'SELECT name FROM users ORDER BY name');
  await runSql(url(), 'TRUNCATE users, groups CASCADE');
  await seed(url());
  expect(await people()).toEqual([]);
  await runSql(url(), `INSERT INTO users (email, name, password_hash) VALUES ('n@skerry.example', 'Somebody', 'none')`);
  await seed(url(), { demo: true });
  expect(await people()).toEqual([{ name: 'Somebody' }]);
});
