import { afterAll, beforeAll, expect, test } from 'vitest';
import { type IdentityQuery, identityQuery } from '@/lib/contracts/identity-query';
import { closeDatabase } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { registerChoices } from '@/lib/register/choices';
import { listIdentities } from '@/lib/register/list';
import { withdrawIdentity } from '@/lib/register/withdraw';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember, query } from '../harness/people';
import { answered, keep, refused } from './register-samples';

const url = ownDatabase();
let author: Member;

const residue = { kind: 'residue', field: 'Q', statement: '[7][5]', hypotheses: [], place: '7', value: '[5]' };

beforeAll(async () => {
  process.env.DATABASE_URL = url();
  const group = await newGroup(url());
  author = await newMember(group, 'author', { url: url() });
  const other = await newMember(group, 'steward', { url: url(), name: 'Odile Farrant' });
  await keep(author, {
    name: 'Steinberg at six',
    field: 'Q',
    statement: '[5][6] = [-1][6]',
    hypotheses: [],
    tags: ['steinberg'],
  });
  await keep(author, { name: 'Square of a symbol', reference: 'Séminaire O’Connor, p. 3', doi: '10.1000/a_b' });
  await keep(other, {
    name: 'Residue at seven',
    ...residue,
    tags: ['residue', 'degree-2'],
    remark: 'By "hand" & <b>twice</b>.',
  });
  await keep(author, { name: 'Rational functions', field: 'Q(s)(t)', statement: '[t][1-t] = 0', hypotheses: [] });
  const { key } = await keep(author, {
    name: 'Six as a product',
    field: 'Q',
    statement: '[6] = [2] + [3]',
    hypotheses: [],
    warning: true,
  });
  answered(await withdrawIdentity(author, key, { base: 1, reason: 'Said better elsewhere.' }));
  // A register of another group, of which nothing may be seen.
  await keep(await newMember(await newGroup(url()), 'author', { url: url() }), { name: 'Steinberg elsewhere' });
});
afterAll(closeDatabase);

const ask = (texts: Record<string, string>): IdentityQuery => identityQuery.parse(texts);
const list = async (texts: Record<string, string> = {}) => answered(await listIdentities(author, ask(texts)));
const numbers = async (texts: Record<string, string>) =>
  (await list({ sort: 'number', ...texts })).identities.map(({ number }) => number);

test('the register of the group, what was changed last first, with counts of its states', async () => {
  const { identities, total, states, next } = await list();
  expect(identities.map(({ number }) => number)).toEqual([5, 4, 3, 2, 1]);
  expect({ total, states, next }).toEqual({
    total: 5,
    states: { draft: 1, checked: 3, withdrawn: 1 },
    next: undefined,
  });
});

test.each([
  [{ state: 'withdrawn' }, [5]],
  [{ field: 'Q' }, [1, 3, 5]],
  [{ field: '\\mathbb{Q}' }, [1, 3, 5]],
  [{ field: 'Q(s)(t)' }, [4]],
  [{ degree: '2' }, [1, 2, 3]],
  [{ degree: '1' }, [5]],
  [{ verdict: 'refused' }, [4]],
  [{ verdict: 'different' }, [5]],
  [{ tag: 'steinberg' }, [1]],
  [{ tag: 'Degree-2' }, [3]],
  [{ keeper: 'Odile Farrant' }, [3]],
  [{ keeper: 'Odile' }, []],
  [{ field: 'Q', keeper: 'Tobias Renk', state: 'checked' }, [1]],
])('the filter %j leaves %j', async (filter, expected) => {
  expect(await numbers(filter)).toEqual(expected);
});

test('counts of states follow the other filters, the total follows all', async () => {
  const { total, states } = await list({ field: 'Q', state: 'checked' });
  expect({ total, states }).toEqual({ total: 2, states: { draft: 0, checked: 2, withdrawn: 1 } });
});

test.each([
  ['steinberg', [1]],
  ['STEIN', [1]],
  ['six', [1, 5]],
  ['six product', [5]],
  ['product six', [5]],
  ['six symbol', []],
  ['withdrawn', [5]],
  ['draft', [4]],
  ['farrant', [3]],
  ['seminaire', [2]],
  ['o’connor', [2]],
  ["O'Connor", [2]],
  ['10.1000/a_b', [2]],
  ['twice', [3]],
  ['degree-2', [3]],
  // Signs mean nothing, alone or among words.
  ['', [1, 2, 3, 4, 5]],
  ['!!! & | ( ) : * \' " \\ <-> ;--', [1, 2, 3, 4, 5]],
  ["six' OR 1=1 --", []],
  ['six & !product', [5]],
  ['six | steinberg', [1]],
  ['six:*', [1, 5]],
  ['(six', [1, 5]],
  ["'six", [1, 5]],
  ['six\\', [1, 5]],
  ['six\0\ud800', [1, 5]],
  ['%', [1, 2, 3, 4, 5]],
  ['x'.repeat(200), []],
  ['ζ ℚ 𝔽₇ سلام', []],
])('the words %j find %j', async (words, expected) => {
  expect(await numbers({ words })).toEqual(expected);
});

test.each([
  ['number', [1, 2, 3, 4, 5]],
  ['-number', [5, 4, 3, 2, 1]],
  ['changed', [1, 2, 3, 4, 5]],
  ['name', [4, 3, 5, 2, 1]],
  ['-name', [1, 2, 5, 3, 4]],
  ['state', [1, 2, 3, 4, 5]],
  ['-state', [5, 4, 3, 2, 1]],
])('sorted by %s', async (sort, expected) => {
  expect(await numbers({ sort })).toEqual(expected);
  // The same order, page by page.
  const paged: number[] = [];
  for (let cursor: string | undefined = ''; cursor !== undefined;) {
    const page = await list({ sort, limit: '2', ...(cursor === '' ? {} : { cursor }) });
    paged.push(...page.identities.map(({ number }) => number));
    cursor = page.next;
  }
  expect(paged).toEqual(expected);
});

test('pages stay where they are while others keep and change', async () => {
  const member = await newMember(await newGroup(url()), 'author', { url: url() });
  for (let index = 1; index <= 6; index += 1) await keep(member, { name: index % 2 === 0 ? 'Even' : 'Odd' });
  // Rows of one moment are told apart by their numbers.
  await query(url(), 'UPDATE identities SET changed_at = $2 WHERE group_id = $1', [
    member.group.id,
    '2026-05-01T10:00:00.123456Z',
  ]);
  for (const sort of ['-changed', 'changed', 'name', '-state']) {
    const seen: number[] = [];
    const page = async (cursor?: string) => {
      const answer = answered(
        await listIdentities(member, ask({ sort, limit: '2', ...(cursor === undefined ? {} : { cursor }) })),
      );
      seen.push(...answer.identities.map(({ number }) => number));
      return answer.next;
    };
    const second = await page();
    await query(
      url(),
      `INSERT INTO identities (group_id, number, revision, state, visibility, keeper_name, name, kind, field, words, changed_at)
       SELECT group_id, (SELECT max(number) + 1 FROM identities WHERE group_id = $1), 1, 'checked', 'group', 'x', 'A first', 'equality', 'Q', '', $2
         FROM identities WHERE group_id = $1 LIMIT 1`,
      [member.group.id, sort === '-changed' || sort === '-state' ? '2027-01-01' : '2020-01-01'],
    );
    const third = await page(second);
    await page(third);
    expect([...seen].sort((a, b) => a - b)).toEqual([1, 2, 3, 4, 5, 6]);
    await query(url(), `DELETE FROM identities WHERE group_id = $1 AND name = 'A first'`, [member.group.id]);
  }
});

test.each([
  ['nothing', ''],
  ['no base64', '%%%'],
  ['no JSON', Buffer.from('[').toString('base64url')],
  ['another shape', Buffer.from('["-changed",{"number":1}]').toString('base64url')],
  ['another order', Buffer.from('["number",{"number":1}]').toString('base64url')],
  ['no moment', Buffer.from('["-changed",{"number":1,"changed":"2026-02-31T10:00:00.000000Z"}]').toString('base64url')],
  [
    'the year 0',
    Buffer.from('["-changed",{"number":1,"changed":"0000-12-31T23:59:59.999999Z"}]').toString('base64url'),
  ],
  ['SQL', Buffer.from(`["-changed",{"number":1,"changed":"now(); DROP TABLE identities"}]`).toString('base64url')],
  ['a large number', Buffer.from('["number",{"number":1e300}]').toString('base64url')],
])('a cursor that is %s is refused', async (_, cursor) => {
  expect(refused(await listIdentities(author, ask({ cursor })))).toMatchObject({
    status: 422,
    code: 'invalid',
    part: 'cursor',
  });
});

test('a field that cannot be read is refused', async () => {
  expect(refused(await listIdentities(author, ask({ field: 'Q(' })))).toMatchObject({
    status: 422,
    code: 'syntax',
    part: 'field',
  });
});

test('what there is to choose from', async () => {
  expect(await registerChoices(author)).toEqual({
    fields: [
      { text: 'Q', tex: '\\mathbb{Q}' },
      { text: 'Q(s)(t)', tex: '\\mathbb{Q}(s)(t)' },
      { text: 'any', tex: '\\mathrm{any}' },
    ],
    tags: ['degree-2', 'residue', 'steinberg'],
    keepers: ['Odile Farrant', 'Tobias Renk'],
    degrees: [2, 1],
  });
});
