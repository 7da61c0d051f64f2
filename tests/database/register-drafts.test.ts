import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { emptyForm } from '@/app/_components/register/writing/form-values';
import { closeDatabase } from '@/lib/database/connection';
import { dropDraft, keepDraft, openDraft } from '@/lib/register/drafts';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember, query } from '../harness/people';

const url = ownDatabase();
let author = '';
let other = '';

beforeAll(() => {
  process.env.DATABASE_URL = url();
});
afterAll(closeDatabase);

beforeEach(async () => {
  const group = await newGroup(url());
  author = (await newMember(group, 'author', { url: url() })).person.id;
  other = (await newMember(group, 'author', { url: url(), name: 'Maren Iwuji' })).person.id;
});

const draft = (name: string, base?: number) => ({
  form: { ...emptyForm, name },
  ...(base === undefined ? {} : { base }),
});

test('a draft is kept under its key, replaced by the next, its writer’s alone, and forgotten', async () => {
  expect(await openDraft(author, 'keep')).toBeUndefined();
  expect(await keepDraft(author, 'keep', draft('one'))).toBe(true);
  expect(await keepDraft(author, 'keep', draft('two'))).toBe(true);
  expect(await keepDraft(author, 'revise:skerry-6', draft('six', 3))).toBe(true);
  expect((await openDraft(author, 'keep'))?.draft.form.name).toBe('two');
  expect((await openDraft(author, 'revise:skerry-6'))?.draft.base).toBe(3);
  expect(await openDraft(other, 'keep')).toBeUndefined();
  await dropDraft(author, 'keep');
  expect(await openDraft(author, 'keep')).toBeUndefined();
  expect(await openDraft(author, 'revise:skerry-6')).toBeDefined();
});

test('what is no draft, or belongs nowhere, is not kept', async () => {
  for (const key of ['', 'other', 'revise:', 'revise:skerry', "revise:skerry-1'; --", 'KEEP', 7, undefined])
    expect(await keepDraft(author, key, draft('one')), String(key)).toBe(false);
  for (const body of [
    undefined,
    {},
    { form: {} },
    { form: { ...emptyForm, groupId: 'x' } },
    { ...draft('one'), more: 1 },
    draft('one', 0),
    { form: { ...emptyForm, name: 7 } },
    { form: { ...emptyForm, remark: 'x'.repeat(60_001) } },
    // more bytes than one draft may have
    { form: { ...emptyForm, statement: '⟨'.repeat(59_000), value: '⟨'.repeat(59_000) } },
  ])
    expect(await keepDraft(author, 'keep', body)).toBe(false);
  expect(await openDraft(author, 'keep')).toBeUndefined();
});

test('signs that the database does not keep are replaced, and backslashes stay as they are', async () => {
  expect(await keepDraft(author, 'keep', draft('a\0b\ud800c \\u0000 \\ud800'))).toBe(true);
  expect((await openDraft(author, 'keep'))?.draft.form.name).toBe('a\ufffdb\ufffdc \\u0000 \\ud800');
});

test('a person has so many drafts; the oldest give way', async () => {
  for (let number = 1; number <= 53; number += 1) await keepDraft(author, `revise:skerry-${number}`, draft('x', 1));
  await keepDraft(other, 'keep', draft('mine'));
  const rows = await query<{ key: string }>(url(), 'SELECT key FROM drafts WHERE user_id = $1', [author]);
  expect(rows).toHaveLength(50);
  expect(rows.map(({ key }) => key)).not.toContain('revise:skerry-1');
  expect(await openDraft(other, 'keep')).toBeDefined();
});

test('what was kept in another shape is no draft', async () => {
  await query(url(), `INSERT INTO drafts (user_id, key, body) VALUES ($1, 'keep', '{"old": true}')`, [author]);
  expect(await openDraft(author, 'keep')).toBeUndefined();
});
