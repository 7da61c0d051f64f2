import { afterAll, beforeAll, expect, test } from 'vitest';
import { auditFilterOf } from '@/lib/audit/filter';
import { type AuditEntry, auditPeople, everyAudit, listAudit } from '@/lib/audit/list';
import { record } from '@/lib/audit/record';
import { closeDatabase, database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { runSql } from '../harness/database';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember } from '../harness/people';

const url = ownDatabase();
let odile: Member;
let other: Member;

beforeAll(async () => {
  process.env.DATABASE_URL = url();
  odile = await newMember(await newGroup(url()), 'steward', { url: url(), name: 'Odile Farrant' });
  other = await newMember(await newGroup(url()), 'steward', { url: url(), name: 'Maren Iwuji' });
  await runSql(
    url(),
    `INSERT INTO audit_events (group_id, actor_id, actor_name, action, subject, at)
     SELECT '${odile.group.id}', '${odile.person.id}', CASE WHEN n % 2 = 0 THEN 'Odile Farrant' ELSE 'Tobias Renk' END,
            CASE WHEN n % 3 = 0 THEN 'identity-revised' ELSE 'identity-kept' END, 'skerry-' || n,
            '2026-10-01T00:00:00Z'::timestamptz + n * interval '6 hours'
       FROM generate_series(0, 119) n`,
    `INSERT INTO audit_events (group_id, actor_name, action, subject)
     VALUES ('${other.group.id}', 'Maren Iwuji', 'identity-kept', 'tarn-1')`,
  );
});
afterAll(closeDatabase);

const subjects = (entries: readonly AuditEntry[]): string[] => entries.map(({ subject }) => subject);
const numbered = (from: number, to: number): string[] =>
  Array.from({ length: from - to + 1 }, (_, index) => `skerry-${from - index}`);

test('the trail of a group is read from the newest back and forth again, and no other group’s', async () => {
  const group = odile.group.id;
  const first = await listAudit(group, {});
  expect(subjects(first.entries)).toEqual(numbered(119, 70));
  expect(first.newer).toBeUndefined();
  const second = await listAudit(group, {}, { before: first.older });
  expect(subjects(second.entries)).toEqual(numbered(69, 20));
  const last = await listAudit(group, {}, { before: second.older });
  expect(subjects(last.entries)).toEqual(numbered(19, 0));
  expect(last.older).toBeUndefined();
  const back = await listAudit(group, {}, { after: last.newer ?? '' });
  expect(subjects(back.entries)).toEqual(numbered(69, 20));
  expect(await listAudit(group, {}, { after: back.newer ?? '' })).toEqual(first);
  expect(subjects((await listAudit(other.group.id, {})).entries)).toEqual(['tarn-1']);
});

test.each([
  ['a person', { person: 'Tobias Renk' }, (n: number) => n % 2 === 1],
  ['a deed', { action: 'identity-revised' }, (n: number) => n % 3 === 0],
  ['a first day', { from: '2026-10-28' }, (n: number) => n >= 108],
  ['a last day, all of it', { to: '2026-10-02' }, (n: number) => n < 8],
  ['one day', { from: '2026-10-05', to: '2026-10-05' }, (n: number) => n >= 16 && n < 20],
  ['a word in any case', { words: 'SKERRY-7' }, (n: number) => String(n).startsWith('7')],
  ['two words', { words: '  -1  9 ' }, (n: number) => /^1.*9|^1.*9/.test(String(n))],
  ['all of it together', { person: 'Odile Farrant', action: 'identity-kept', words: '110' }, (n: number) => n === 110],
])('it can be narrowed to %s', async (_, query, fits) => {
  const wanted = Array.from({ length: 120 }, (_value, n) => n)
    .filter(fits)
    .map((n) => `skerry-${n}`)
    .reverse();
  const { entries } = await listAudit(odile.group.id, auditFilterOf(query));
  expect(subjects(entries)).toEqual(wanted.slice(0, 50));
  const all: string[] = [];
  for await (const portion of everyAudit(odile.group.id, auditFilterOf(query))) all.push(...subjects(portion));
  expect(all).toEqual(wanted);
});

test('signs that mean something to the database are letters here', async () => {
  await database().transaction((transaction) =>
    record(
      { groupId: other.group.id, actor: other.person, action: 'token-made', subject: `50% of a_b \\ 'x' "y"` },
      transaction,
    ),
  );
  for (const words of ['%', '_', '\\', "'x'", '"y"', '50% a_b'])
    expect((await listAudit(other.group.id, auditFilterOf({ words }))).entries, words).toHaveLength(1);
  expect((await listAudit(other.group.id, auditFilterOf({ words: "') OR true --" }))).entries).toEqual([]);
});

test.each([
  ['a deed there is none of', { action: 'toString' }],
  ['a day there is none of', { from: '2026-02-30' }],
  ['no day', { to: 'yesterday' }],
  ['a year before all calendars', { from: '0000-01-01' }],
  ['empty texts', { person: ' ', words: '', action: '', from: '', to: '' }],
])('%s narrows nothing', async (_, query) => {
  expect(Object.values(auditFilterOf(query)).filter((value) => value !== undefined)).toEqual([]);
});

test.each(['', 'x', '-1', '1e3', '9'.repeat(30), "1' OR '1'='1"])(
  '%j is no place and begins at the top',
  async (id) => {
    expect(subjects((await listAudit(odile.group.id, {}, { before: id })).entries)).toEqual(numbered(119, 70));
    expect(subjects((await listAudit(odile.group.id, {}, { after: id })).entries)).toEqual(numbered(119, 70));
  },
);

test('those who did something can be chosen by name, also after they are gone', async () => {
  expect(await auditPeople(odile.group.id)).toEqual(['Odile Farrant', 'Tobias Renk']);
});
