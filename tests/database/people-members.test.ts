import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { closeDatabase } from '@/lib/database/connection';
import { memberOfToken } from '@/lib/people/bearer';
import type { Member } from '@/lib/people/caller';
import { changeRole } from '@/lib/people/change-role';
import { leaveGroup } from '@/lib/people/leave-group';
import { membersOf } from '@/lib/people/members';
import { isRefused } from '@/lib/people/refused';
import { removeMember } from '@/lib/people/remove-member';
import { renameGroup } from '@/lib/people/rename-group';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember, query, tokenOf, type TestGroup } from '../harness/people';

const url = ownDatabase();
let group: TestGroup;
let steward: Member;

beforeAll(() => {
  process.env.DATABASE_URL = url();
});
beforeEach(async () => {
  group = await newGroup(url());
  steward = await newMember(group, 'steward', { url: url(), name: 'Odile Farrant' });
});
afterAll(closeDatabase);

const seat = (role: 'reader' | 'author' | 'reviewer' | 'steward', name?: string) =>
  newMember(group, role, { url: url(), name });
const roles = async () => (await membersOf(group.id)).map(({ role }) => role);
const written = () =>
  query(url(), 'SELECT actor_name, action, subject, detail FROM audit_events WHERE group_id = $1 ORDER BY id', [
    group.id,
  ]);

describe('roles', () => {
  test('are given by stewards and written down', async () => {
    const member = await seat('reader', 'Ines Calloway');
    expect(await changeRole(steward, { userId: member.person.id, role: 'reviewer' })).toEqual({
      name: 'Ines Calloway',
      role: 'reviewer',
    });
    expect(await roles()).toEqual(['steward', 'reviewer']);
    expect(await written()).toEqual([
      {
        actor_name: 'Odile Farrant',
        action: 'role-changed',
        subject: 'Ines Calloway',
        detail: { from: 'reader', to: 'reviewer' },
      },
    ]);
    await changeRole(steward, { userId: member.person.id, role: 'reviewer' });
    expect(await written()).toHaveLength(1);
  });

  test('of someone in another group cannot be given', async () => {
    const stranger = await newMember(await newGroup(url()), 'reader', { url: url() });
    expect(await changeRole(steward, { userId: stranger.person.id, role: 'steward' })).toEqual({
      refused: 'This person is no longer in the group.',
    });
    expect(await removeMember(steward, stranger.person.id)).toEqual({
      refused: 'This person is no longer in the group.',
    });
  });

  test('cannot be given by someone who has just lost the right to', async () => {
    const other = await seat('steward');
    await changeRole(other, { userId: steward.person.id, role: 'author' });
    expect(await changeRole(steward, { userId: steward.person.id, role: 'steward' })).toEqual({
      refused: 'You are no longer a steward of this group.',
    });
    expect(await renameGroup(steward, 'Mine')).toMatchObject({ refused: expect.any(String) });
  });
});

describe('the last steward', () => {
  test('is not demoted, not removed and does not leave', async () => {
    await seat('reviewer');
    const { id } = steward.person;
    expect(await changeRole(steward, { userId: id, role: 'reader' })).toMatchObject({ field: 'role' });
    expect(await removeMember(steward, id)).toMatchObject({ refused: expect.stringContaining('needs a steward') });
    expect(await leaveGroup(steward)).toMatchObject({ refused: expect.stringContaining('the only steward') });
    expect(await roles()).toEqual(['steward', 'reviewer']);
    expect(await written()).toEqual([]);
  });

  test('is never undone by two stewards who go at the same moment', async () => {
    for (let round = 0; round < 8; round += 1) {
      const a = await newMember(await newGroup(url()), 'steward', { url: url() });
      const b = await newMember(a.group, 'steward', { url: url() });
      const ways = [
        () => [leaveGroup(a), leaveGroup(b)],
        () => [leaveGroup(a), changeRole(b, { userId: b.person.id, role: 'reader' })],
        () => [removeMember(a, b.person.id), removeMember(b, a.person.id)],
        () => [
          changeRole(a, { userId: b.person.id, role: 'author' }),
          changeRole(b, { userId: a.person.id, role: 'author' }),
        ],
      ];
      const outcomes = await Promise.all(ways[round % ways.length]?.() ?? []);
      expect(outcomes.filter((outcome) => !isRefused(outcome))).toHaveLength(1);
      expect((await membersOf(a.group.id)).filter(({ role }) => role === 'steward')).toHaveLength(1);
    }
  });

  test('ten stewards leave at once and one stays', async () => {
    const all = [steward, ...(await Promise.all(Array.from({ length: 9 }, () => seat('steward'))))];
    await Promise.all(all.map(leaveGroup));
    expect(await roles()).toEqual(['steward']);
  });
});

describe('going', () => {
  test.each(['removed', 'gone by oneself'])('%s: seat and tokens end at once and do not come back', async (way) => {
    const member = await seat('author', 'Tobias Renk');
    const { authorization } = await tokenOf(member, ['read'], { url: url() });
    const secret = authorization.slice('Bearer '.length);
    expect(await memberOfToken(secret)).toMatchObject({ kind: 'member' });
    if (way === 'removed') await removeMember(steward, member.person.id);
    else await leaveGroup(member);
    expect(await roles()).toEqual(['steward']);
    expect(await memberOfToken(secret)).toBeUndefined();
    await query(url(), "INSERT INTO memberships (group_id, user_id, role) VALUES ($1, $2, 'author')", [
      group.id,
      member.person.id,
    ]);
    expect(await memberOfToken(secret)).toBeUndefined();
    expect(await written()).toMatchObject([{ action: way === 'removed' ? 'member-removed' : 'member-left' }]);
  });

  test('twice is refused the second time', async () => {
    const member = await seat('author');
    expect(isRefused(await leaveGroup(member))).toBe(false);
    expect(await leaveGroup(member)).toEqual({ refused: 'You are no longer in this group.' });
    expect(await removeMember(steward, member.person.id)).toMatchObject({ refused: expect.any(String) });
  });
});

test('a group is renamed, and keeps its short name', async () => {
  expect(await renameGroup(steward, 'Skerry and shoal')).toEqual({ name: 'Skerry and shoal' });
  expect(await query(url(), 'SELECT name, slug FROM groups WHERE id = $1', [group.id])).toEqual([
    { name: 'Skerry and shoal', slug: group.slug },
  ]);
  expect(await written()).toMatchObject([{ action: 'group-renamed', detail: { from: 'Skerry seminar' } }]);
});
