import { expect, test } from 'vitest';
import { get, post, send } from '../../harness/http';
import { memberBattery } from '../batteries/member-call';
import { kept, newRoom } from '../batteries/room';

const path = '/api/v1/identities/{key}';

memberBattery({ method: 'get', path, scope: 'read', success: 200, open: true });

test('what is not there and what is not yours look alike', async () => {
  const room = await newRoom();
  const { key } = await kept(room);
  const hidden = await get(`/api/v1/identities/${key}`);
  const missing = await get(`/api/v1/identities/${room.group.slug}-999`);
  expect(hidden).toMatchObject({ status: 404, body: missing.body as object });
});

test('a public identity shows no address, no id and no other of the group', async () => {
  const room = await newRoom();
  await kept(room, { name: 'Hidden beside it' });
  const { key } = await kept(room, { visibility: 'public' });
  const { text } = await get(`/api/v1/identities/${key}`);
  for (const secret of [room.author.person.email, room.author.person.id, room.group.id, 'Hidden beside it'])
    expect(text).not.toContain(secret);
});

test('hidden again, it is gone at once', async () => {
  const room = await newRoom();
  const { key } = await kept(room, { visibility: 'public' });
  await post(`/api/v1/identities/${key}/visibility`, { visibility: 'group' }, room.token);
  expect((await get(`/api/v1/identities/${key}`)).status).toBe(404);
});

test('other methods are told what answers here', async () => {
  const room = await newRoom();
  const { key } = await kept(room);
  for (const method of ['POST', 'PUT', 'PATCH', 'DELETE']) {
    const answer = await send(`/api/v1/identities/${key}`, { method, headers: room.token });
    expect(answer).toMatchObject({ status: 405, type: 'application/problem+json' });
    expect(answer.headers.get('allow')).toBe('GET, HEAD, OPTIONS');
  }
});
