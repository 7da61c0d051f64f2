import { expect, test } from 'vitest';
import { type Answer, get } from '../../harness/http';
import { newGroup, newMember, query, serverDatabase, tokenOf } from '../../harness/people';
import { expectProblem } from '../batteries/described';

const path = '/api/v1/token';
const refused = (answer: Answer) => expectProblem(path, answer, 401, 'unauthenticated', {}, 'get');

test('a token that is expired or revoked is no token, from that moment on', async () => {
  const member = await newMember(await newGroup(), 'author');
  await refused(await get(path, await tokenOf(member, ['read'], { expired: true })));
  await refused(await get(path, await tokenOf(member, ['read'], { revoked: true })));
  const token = await tokenOf(member);
  expect((await get(path, token)).status).toBe(200);
  await query(serverDatabase(), 'UPDATE api_tokens SET revoked_at = now() WHERE user_id = $1', [member.person.id]);
  await refused(await get(path, token));
});

test('whoever is out of the group, or out of the installation, has no token', async () => {
  for (const gone of ['DELETE FROM memberships WHERE user_id = $1', 'DELETE FROM users WHERE id = $1']) {
    const member = await newMember(await newGroup(), 'steward');
    const token = await tokenOf(member);
    await query(serverDatabase(), gone, [member.person.id]);
    await refused(await get(path, token));
  }
});

test('nothing but the whole token is the token', async () => {
  const member = await newMember(await newGroup(), 'author');
  const { authorization } = await tokenOf(member);
  const secret = authorization.replace('Bearer ', '');
  const [row] = await query<{ token_hash: string; id: string }>(
    serverDatabase(),
    'SELECT id, token_hash FROM api_tokens WHERE user_id = $1',
    [member.person.id],
  );
  const guesses = [
    `Bearer ${row?.token_hash}`,
    `Bearer ${row?.id}`,
    `Bearer ${secret.slice(0, -1)}`,
    `Bearer ${secret}A`,
    `Bearer ${secret.toLowerCase()}`,
    `Bearer ${secret.slice(4)}`,
    `Bearer ${secret}, Bearer ${secret}`,
    `Basic ${Buffer.from(`x:${secret}`).toString('base64')}`,
    secret,
    `Bearer ' OR true --`,
    'Bearer',
    `Bearer ${'A'.repeat(7000)}`,
  ];
  for (const guess of guesses) await refused(await get(path, { authorization: guess }));
  expect((await get(path, { authorization: `bearer  ${secret}` })).status).toBe(200);
});

test('a token in the address is not read, and is not told back', async () => {
  const { authorization } = await tokenOf(await newMember(await newGroup(), 'author'));
  const secret = authorization.replace('Bearer ', '');
  for (const key of ['token', 'access_token', 'authorization']) {
    const answer = await get(`${path}?${key}=${secret}`);
    await refused(answer);
    expect(answer.text).not.toContain(secret);
  }
});

test('it says nothing of the token itself, of ids or of addresses, and nobody may keep it', async () => {
  const member = await newMember(await newGroup(), 'author');
  const token = await tokenOf(member);
  const { text, headers } = await get(path, token);
  expect(text).not.toContain(token.authorization.replace('Bearer ', '').slice(4));
  expect(text).not.toContain(member.person.email);
  expect(text).not.toMatch(/[\da-f]{8}-[\da-f]{4}-/);
  expect(headers.get('cache-control')).toBe('no-store');
  expect(headers.get('set-cookie')).toBeNull();
});
