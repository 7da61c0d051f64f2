import { expect, test } from 'vitest';
import { tokenAnswer } from '@/lib/contracts/token';
import type { MemberRole } from '@/models/role';
import { get, send } from '../../harness/http';
import { newGroup, newMember, query, serverDatabase, tokenOf } from '../../harness/people';
import { expectDescribed } from '../batteries/described';

const path = '/api/v1/token';

test.each<MemberRole>(['reader', 'author', 'reviewer', 'steward'])(
  'a token of a %s says whom it acts for, and what it may do',
  async (role) => {
    const group = await newGroup(undefined, 'Skerry seminar');
    const member = await newMember(group, role, { name: 'Maren Iwuji' });
    const answer = await get(path, await tokenOf(member, ['compute', 'read']));
    expect(answer).toMatchObject({ status: 200, type: 'application/json' });
    await expectDescribed('get', path, answer);
    const { expiresAt, ...rest } = tokenAnswer.parse(answer.body);
    expect(rest).toEqual({
      name: 'night run',
      person: { name: 'Maren Iwuji' },
      group: { name: 'Skerry seminar', slug: group.slug },
      role,
      scopes: ['compute', 'read'],
    });
    const [row] = await query<{ expires_at: Date }>(
      serverDatabase(),
      'SELECT expires_at FROM api_tokens WHERE user_id = $1',
      [member.person.id],
    );
    expect(expiresAt).toBe(row?.expires_at.toISOString());
  },
);

test.each(['read', 'compute', 'write'] as const)('the scope %s alone is enough to ask', async (scope) => {
  const answer = await get(path, await tokenOf(await newMember(await newGroup(), 'author'), [scope]));
  expect(answer.body).toMatchObject({ scopes: [scope] });
});

test('the role is the one that the person has now', async () => {
  const member = await newMember(await newGroup(), 'steward');
  const token = await tokenOf(member);
  await query(serverDatabase(), `UPDATE memberships SET role = 'reader' WHERE user_id = $1`, [member.person.id]);
  expect((await get(path, token)).body).toMatchObject({ role: 'reader' });
});

test('a token acts in the group it was made for, whatever other groups there are', async () => {
  const member = await newMember(await newGroup(undefined, 'Tarn reading group'), 'author');
  const first = await newGroup(undefined, 'A group with a name that comes first');
  await query(serverDatabase(), `INSERT INTO memberships (group_id, user_id, role) VALUES ($1, $2, 'steward')`, [
    first.id,
    member.person.id,
  ]);
  expect((await get(path, await tokenOf(member))).body).toMatchObject({ group: { name: 'Tarn reading group' } });
  const other = await tokenOf({ ...member, group: { ...first, role: 'steward' } });
  const cookie = `quadrel-group=${member.group.slug}`;
  expect((await get(path, { ...other, cookie })).body).toMatchObject({ group: { name: first.name }, role: 'steward' });
});

test('that it was used is noted', async () => {
  const member = await newMember(await newGroup(), 'reader');
  const token = await tokenOf(member);
  const used = () =>
    query(
      serverDatabase(),
      `SELECT last_used_at > now() - interval '5 minutes' AS just FROM api_tokens WHERE user_id = $1`,
      [member.person.id],
    );
  expect(await used()).toEqual([{ just: null }]);
  await get(path, token);
  expect(await used()).toEqual([{ just: true }]);
});

test('HEAD answers as GET does, without the body', async () => {
  const headers = await tokenOf(await newMember(await newGroup(), 'reader'));
  expect(await send(path, { method: 'HEAD', headers })).toMatchObject({ status: 200, text: '' });
});
