import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { identityAnswer } from '@/lib/contracts/identity-answer';
import { closeDatabase } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { keepIdentity } from '@/lib/register/keep';
import { openIdentity } from '@/lib/register/open';
import { recheckIdentity } from '@/lib/register/recheck';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember, query } from '../harness/people';
import { answered, content, keep, refused } from './register-samples';

const url = ownDatabase();
let author: Member;

beforeAll(() => {
  process.env.DATABASE_URL = url();
});
afterAll(closeDatabase);
beforeEach(async () => {
  author = await newMember(await newGroup(url()), 'author', { url: url() });
});

const count = async (table: string): Promise<number | undefined> =>
  (await query<{ count: number }>(url(), `SELECT count(*)::int AS count FROM ${table}`))[0]?.count;

test('an identity is kept with its number, its first revision, its check and the event', async () => {
  const kept = await keep(author, {
    tags: ['Steinberg', 'degree-2', 'steinberg'],
    reference: 'Seminar note 4, lemma 2.',
    doi: 'https://doi.org/10.1000/lemma-2',
    arxiv: 'arXiv:2301.01234v2',
    remark: 'Used with a = 5.\nTwice.',
  });
  identityAnswer.parse(kept);
  expect(kept).toMatchObject({
    key: `${author.group.slug}-1`,
    number: 1,
    group: { name: 'Skerry seminar', slug: author.group.slug },
    revision: 1,
    current: 1,
    state: 'checked',
    visibility: 'group',
    kind: 'equality',
    field: { text: 'any' },
    statement: { text: '[a][a] = [-1][a]', tex: '[a][a] = [-1][a]' },
    hypotheses: [{ text: 'a != 1', tex: 'a \\ne 1' }],
    warning: false,
    doi: '10.1000/lemma-2',
    arxiv: '2301.01234v2',
    tags: ['steinberg', 'degree-2'],
    keeper: 'Tobias Renk',
    degrees: [2],
    lastCheck: { verdict: 'equal', sentence: 'The sides are equal, in degree 2.' },
    revisions: [{ number: 1, author: 'Tobias Renk' }],
    checks: [{ revision: 1, verdict: 'equal' }],
    evidence: { compare: { verdict: 'equal' } },
  });
  expect(await openIdentity(author, kept.key)).toEqual(kept);
  const events = await query(url(), 'SELECT actor_name, action, subject FROM audit_events WHERE group_id = $1', [
    author.group.id,
  ]);
  expect(events).toEqual([{ actor_name: 'Tobias Renk', action: 'identity-kept', subject: kept.key }]);
});

test('hypotheses after a semicolon stand among the hypotheses, and the sides stay as they were typed', async () => {
  const { statement, hypotheses } = await keep(author, {
    statement: '[a] [a]  =  [-1][a] ; a \\ne 1, char != 2',
    hypotheses: ['a != 1'],
  });
  expect(statement).toEqual({ text: '[a] [a]  =  [-1][a]', tex: '[a][a] = [-1][a]' });
  expect(hypotheses.map(({ text }) => text)).toEqual(['a != 1', 'char != 2']);
  const dressed = await keep(author, { statement: '$[a][a] = [-1][a] ; a \\ne 1$', hypotheses: [] });
  expect(dressed.statement.text).toBe('[a][a] = [-1][a]');
});

test('what is different is refused, with the reason, and kept as a warning only', async () => {
  const different = { field: 'Q', statement: '[6] = [2] + [3]', hypotheses: [] };
  const before = await count('identities');
  expect(refused(await keepIdentity(author, content(different)))).toMatchObject({
    status: 422,
    code: 'sides-differ',
    detail: expect.stringMatching(
      /^The sides are different\. Different in degree 1.*Keep it as a warning, or change it\.$/s,
    ) as string,
  });
  expect(await count('identities')).toBe(before);
  expect(await keep(author, { ...different, warning: true })).toMatchObject({
    number: 1,
    state: 'checked',
    warning: true,
    lastCheck: { verdict: 'different' },
  });
  expect(refused(await keepIdentity(author, content({ warning: true })))).toMatchObject({
    code: 'sides-agree',
    part: 'warning',
  });
});

test('every step of a chain must hold', async () => {
  const chain = (last: string) => ({
    field: 'F_7',
    statement: `[6] = [2] + [3] + eta[2][3] = ${last}`,
    hypotheses: [],
  });
  expect(await keep(author, chain('[-1]'))).toMatchObject({ state: 'checked' });
  expect(refused(await keepIdentity(author, content(chain('[2]')))).detail).toContain('In step 2 of the chain');
});

test('what the engine does not decide, or not in time, is kept as a draft', async () => {
  const stopped = await keep(author, { field: 'Q', statement: '[(((2^64)^64)^64)^64] = [3]', hypotheses: [] });
  expect(stopped).toMatchObject({ state: 'draft', degrees: [], lastCheck: { verdict: 'stopped' } });
  expect(stopped.evidence?.problem?.code).toBe('size');
  const refusal = await keep(author, { field: 'Q(s)(t)', statement: '[t][1-t] = 0', hypotheses: [] });
  expect(refusal).toMatchObject({ state: 'draft', lastCheck: { verdict: 'refused' } });
});

test('a text that cannot be read is refused with its key and its place', async () => {
  const problem = async (change: Record<string, unknown>) => refused(await keepIdentity(author, content(change)));
  expect(await problem({ statement: '[a][1+a = 0' })).toMatchObject({ code: 'syntax', part: 'statement', line: 1 });
  expect(await problem({ hypotheses: ['a != 1', 'a !'] })).toMatchObject({ code: 'syntax', part: 'hypotheses[1]' });
  expect(await problem({ statement: '[a]' })).toMatchObject({ code: 'invalid', part: 'statement' });
  expect(await problem({ field: 'F_6', statement: '[2] = [3]', hypotheses: [] })).toMatchObject({ code: 'field' });
  expect(await problem({ field: 'Q', statement: '[0] = 0', hypotheses: [] })).toMatchObject({
    code: 'not-a-unit',
    part: 'statement',
    column: 2,
  });
  expect(await problem({ field: 'Q', statement: '[a] = [a]', hypotheses: [] })).toMatchObject({
    code: 'unknown-letter',
  });
});

test('a residue is computed and compared with the value over the residue field', async () => {
  const residue = { kind: 'residue', field: 'Q', statement: '[7][5]', hypotheses: [], place: '7' };
  expect(await keep(author, { ...residue, value: '[5]' })).toMatchObject({
    kind: 'residue',
    state: 'checked',
    place: { text: '7', tex: '7' },
    value: { text: '[5]', tex: '[5]' },
    degrees: [2],
    lastCheck: { verdict: 'equal', sentence: 'Residue and value are equal, in degree 1.' },
    evidence: { residues: { residues: [{ place: '7' }] }, compare: { field: { text: 'F_7' } } },
  });
  expect(await keep(author, { ...residue, uniformizer: '21', value: '<3>[5]' })).toMatchObject({ state: 'checked' });
  const problem = async (change: Record<string, unknown>) =>
    refused(await keepIdentity(author, content({ ...residue, value: '[5]', ...change })));
  expect(await problem({ value: '[2]' })).toMatchObject({ code: 'sides-differ' });
  expect(await problem({ value: '[5' })).toMatchObject({ code: 'syntax', part: 'value' });
  expect(await problem({ value: '[0]' })).toMatchObject({ code: 'not-a-unit', part: 'value' });
  expect(await problem({ place: '6' })).toMatchObject({ code: 'place', part: 'place' });
  expect(await problem({ uniformizer: '49' })).toMatchObject({ code: 'uniformizer', part: 'uniformizer' });
});

test('numbers follow one another, however many are kept at once, and start anew in every group', async () => {
  const other = await newMember(author.group, 'steward', { url: url(), name: 'Odile Farrant' });
  const kept = await Promise.all(
    Array.from({ length: 12 }, (_, index) => keep(index % 2 === 0 ? author : other, { name: `Lemma ${index}` })),
  );
  expect(kept.map(({ number }) => number).sort((a, b) => a - b)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]);
  const elsewhere = await newMember(await newGroup(url()), 'author', { url: url() });
  expect((await keep(elsewhere)).number).toBe(1);
});

test('a role that was taken away while the check ran keeps nothing', async () => {
  await query(url(), `UPDATE memberships SET role = 'reader' WHERE user_id = $1`, [author.person.id]);
  expect(refused(await keepIdentity(author, content()))).toMatchObject({ status: 403, code: 'forbidden' });
  await query(url(), 'DELETE FROM memberships WHERE user_id = $1', [author.person.id]);
  expect(refused(await keepIdentity(author, content())).code).toBe('forbidden');
  const [group] = await query(url(), 'SELECT next_number FROM groups WHERE id = $1', [author.group.id]);
  expect(group).toEqual({ next_number: 1 });
});

test('one request under one key makes one identity', async () => {
  const ask = (change = {}, idempotencyKey = 'night run 1') =>
    keepIdentity(author, content(change), { idempotencyKey });
  const first = answered(await ask());
  expect(answered(await ask())).toEqual(first);
  expect(refused(await ask({ name: 'Another name' }))).toMatchObject({ status: 422, code: 'idempotency-key' });
  expect(answered(await ask({}, 'night run 2')).number).toBe(2);
  // Other people have keys of their own, and after a day a key is free again.
  const other = await newMember(author.group, 'author', { url: url() });
  const theirs = answered(await keepIdentity(other, content(), { idempotencyKey: 'night run 1' }));
  expect(theirs.number).toBe(3);
  await query(url(), `UPDATE idempotency_keys SET created_at = now() - interval '25 hours' WHERE user_id = $1`, [
    author.person.id,
  ]);
  expect(answered(await ask({ name: 'Another name' })).number).toBe(4);
  const keys = await query(url(), 'SELECT key FROM idempotency_keys WHERE user_id = $1', [author.person.id]);
  expect(keys).toEqual([{ key: 'night run 1' }]);
});

test('the same request, sent many times at once, makes one identity', async () => {
  const kept = await Promise.all(
    Array.from({ length: 10 }, () => keepIdentity(author, content(), { idempotencyKey: 'race' })),
  );
  expect(new Set(kept.map((reply) => answered(reply).key)).size).toBe(1);
  const rows = await query(url(), 'SELECT number FROM identities WHERE group_id = $1', [author.group.id]);
  expect(rows).toEqual([{ number: 1 }]);
});

test('a check again is added to the history and moves the state', async () => {
  const { key, changedAt } = await keep(author);
  // As if an engine of before had not decided it.
  await query(url(), `UPDATE identities SET state = 'draft', verdict = 'undecided' WHERE group_id = $1`, [
    author.group.id,
  ]);
  const checked = answered(await recheckIdentity(author, key));
  expect(checked).toMatchObject({ state: 'checked', current: 1, checks: [{ verdict: 'equal' }, { verdict: 'equal' }] });
  expect(checked.changedAt).not.toBe(changedAt);
  const again = answered(await recheckIdentity(author, key));
  expect(again.checks).toHaveLength(3);
  expect(again.changedAt).toBe(checked.changedAt);
  expect(refused(await recheckIdentity(author, `${author.group.slug}-99`)).code).toBe('not-found');
});
