import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { identityRevision } from '@/lib/contracts/identity-content';
import { closeDatabase } from '@/lib/database/connection';
import { visitor } from '@/lib/people/caller';
import type { Member } from '@/lib/people/caller';
import { openIdentity } from '@/lib/register/open';
import { recheckIdentity } from '@/lib/register/recheck';
import { reviseIdentity } from '@/lib/register/revise';
import { changeVisibility } from '@/lib/register/visibility';
import { withdrawIdentity } from '@/lib/register/withdraw';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember, query } from '../harness/people';
import { answered, keep, refused } from './register-samples';

const url = ownDatabase();
let author: Member;
let stranger: Member;
let kept: IdentityAnswer;

beforeAll(() => {
  process.env.DATABASE_URL = url();
});
afterAll(closeDatabase);
beforeEach(async () => {
  author = await newMember(await newGroup(url()), 'author', { url: url() });
  stranger = await newMember(await newGroup(url()), 'steward', { url: url(), name: 'Odile Farrant' });
  kept = await keep(author);
});

const revision = (base: number, change: Record<string, unknown> = {}) =>
  identityRevision.parse({
    base,
    change: 'Says it over every field.',
    name: 'Square of a symbol, shorter',
    field: 'any',
    statement: '[a]^2 = [-1][a]',
    ...change,
  });

const actions = async (): Promise<unknown[]> =>
  (
    await query(url(), 'SELECT action, detail FROM audit_events WHERE group_id = $1 ORDER BY id', [author.group.id])
  ).map(({ action }) => action as unknown);

test('a revision is added, and those before it stay as they were', async () => {
  const revised = answered(await reviseIdentity(author, kept.key, revision(1)));
  expect(revised).toMatchObject({
    revision: 2,
    current: 2,
    state: 'checked',
    name: 'Square of a symbol, shorter',
    revisions: [
      { number: 2, change: 'Says it over every field.' },
      { number: 1, name: 'Square of a symbol' },
    ],
    checks: [{ revision: 2 }, { revision: 1 }],
  });
  expect(revised.revisions[1]).toEqual(kept.revisions[0]);
  const first = await openIdentity(author, kept.key, 1);
  expect(first).toMatchObject({ revision: 1, current: 2, name: 'Square of a symbol', statement: kept.statement });
  expect(await openIdentity(author, kept.key, 3)).toBeUndefined();
  expect(await actions()).toEqual(['identity-kept', 'identity-revised']);
});

test('of two revisions of the same one the second is a conflict that shows the first, and nothing is lost', async () => {
  const replies = await Promise.all(
    ['First', 'Second'].map((name) => reviseIdentity(author, kept.key, revision(1, { name }))),
  );
  const winners = replies.filter((reply) => reply.status === 200).map(answered);
  const losers = replies.filter((reply) => reply.status !== 200).map(refused);
  expect(winners).toHaveLength(1);
  expect(losers).toMatchObject([{ status: 409, code: 'conflict', current: { key: kept.key, current: 2 } }]);
  expect(losers[0]?.current).toMatchObject({ name: winners[0]?.name });
  const rows = await query(
    url(),
    'SELECT r.number FROM revisions r JOIN identities i ON i.id = r.identity_id WHERE i.group_id = $1 ORDER BY 1',
    [author.group.id],
  );
  expect(rows).toEqual([{ number: 1 }, { number: 2 }]);
  expect(refused(await reviseIdentity(author, kept.key, revision(7)))).toMatchObject({ code: 'conflict' });
});

test('a revision that the engine contradicts changes nothing', async () => {
  const problem = refused(await reviseIdentity(author, kept.key, revision(1, { statement: '[a] = [b]' })));
  expect(problem).toMatchObject({ code: 'sides-differ' });
  expect(await openIdentity(author, kept.key)).toEqual(kept);
  const warning = revision(1, { statement: '[a] = [b]', warning: true });
  expect(answered(await reviseIdentity(author, kept.key, warning))).toMatchObject({ state: 'checked', warning: true });
});

test('withdrawing takes the revision one has seen and a reason, and a revision brings it back', async () => {
  expect(refused(await withdrawIdentity(author, kept.key, { base: 2, reason: 'Wrong.' })).code).toBe('conflict');
  const withdrawn = answered(await withdrawIdentity(author, kept.key, { base: 1, reason: 'The sign is wrong.' }));
  expect(withdrawn).toMatchObject({ state: 'withdrawn', withdrawnReason: 'The sign is wrong.', current: 1 });
  const twice = refused(await withdrawIdentity(author, kept.key, { base: 1, reason: 'Again.' }));
  expect(twice).toMatchObject({ code: 'conflict', current: { withdrawnReason: 'The sign is wrong.' } });
  // Another check is kept and does not bring it back.
  const rechecked = answered(await recheckIdentity(author, kept.key));
  expect(rechecked).toMatchObject({ state: 'withdrawn', withdrawnReason: 'The sign is wrong.' });
  expect(rechecked.checks).toHaveLength(2);
  const revised = answered(await reviseIdentity(author, kept.key, revision(1)));
  expect(revised.state).toBe('checked');
  expect(revised).not.toHaveProperty('withdrawnReason');
  expect(await actions()).toEqual(['identity-kept', 'identity-withdrawn', 'identity-checked', 'identity-revised']);
});

test('an identity of another group is not there, unless it is public, and is never to be changed', async () => {
  expect(await openIdentity(stranger, kept.key)).toBeUndefined();
  expect(await openIdentity(visitor, kept.key)).toBeUndefined();
  answered(await changeVisibility(author, kept.key, 'public'));
  for (const caller of [stranger, visitor])
    expect(await openIdentity(caller, kept.key)).toMatchObject({ key: kept.key, visibility: 'public' });
  const changes = [
    reviseIdentity(stranger, kept.key, revision(1)),
    withdrawIdentity(stranger, kept.key, { base: 1, reason: 'Not mine.' }),
    recheckIdentity(stranger, kept.key),
    changeVisibility(stranger, kept.key, 'group'),
  ];
  for (const change of changes) expect(refused(await change)).toMatchObject({ status: 404, code: 'not-found' });
  answered(await changeVisibility(author, kept.key, 'group'));
  expect(await openIdentity(visitor, kept.key)).toBeUndefined();
  expect(await actions()).toEqual(['identity-kept', 'identity-shown', 'identity-shown']);
});

test('showing it as it is shown already is no event', async () => {
  answered(await changeVisibility(author, kept.key, 'group'));
  expect(await actions()).toEqual(['identity-kept']);
});

test.each(['', 'skerry', 'skerry-0', 'skerry-01', 'skerry--1', 'SKERRY-1', 'skerry-1/2', "skerry'-1", '-1', '1'])(
  '%j is no key of anything',
  async (key) => {
    expect(await openIdentity(author, key)).toBeUndefined();
    expect(refused(await withdrawIdentity(author, key, { base: 1, reason: 'None.' })).code).toBe('not-found');
  },
);

test('a member who is a reader by now changes nothing', async () => {
  await query(url(), `UPDATE memberships SET role = 'reader' WHERE user_id = $1`, [author.person.id]);
  const changes = [
    reviseIdentity(author, kept.key, revision(1)),
    withdrawIdentity(author, kept.key, { base: 1, reason: 'Mine no more.' }),
    recheckIdentity(author, kept.key),
    changeVisibility(author, kept.key, 'public'),
  ];
  for (const change of changes) expect(refused(await change)).toMatchObject({ status: 403, code: 'forbidden' });
  expect(await openIdentity(author, kept.key)).toEqual(kept);
});
