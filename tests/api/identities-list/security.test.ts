import { beforeAll, expect, test } from 'vitest';
import { get, post } from '../../harness/http';
import { memberBattery } from '../batteries/member-call';
import { kept, newRoom, type Room } from '../batteries/room';

const path = '/api/v1/identities';
let room: Room;

beforeAll(async () => {
  room = await newRoom();
  await kept(room, { name: 'Ours' });
});

memberBattery({ method: 'get', path, scope: 'read', success: 200 });

test('nothing of another group is listed, public or not, and none of its cursors shows more', async () => {
  const other = await newRoom();
  await kept(other, { name: 'Theirs' });
  await kept(other, { name: 'Theirs too', visibility: 'public' });
  const ours = await get(path, room.token);
  expect(ours.body).toMatchObject({ total: 1, identities: [{ name: 'Ours' }] });
  const { next } = (await get(`${path}?limit=1&sort=number`, other.token)).body as { next: string };
  const moved = await get(`${path}?limit=1&sort=-number&cursor=${next}`, room.token);
  expect(moved.status).toBe(422);
  const across = await get(`${path}?limit=1&sort=number&cursor=${next}`, room.token);
  expect(across.body).toMatchObject({ identities: [] });
});

test.each([
  `' OR '1'='1`,
  `x'); DELETE FROM identities; --`,
  '\\',
  '\0',
  '<script>alert(1)</script>',
  '%',
  '_',
  `a' | 'b`,
  ':*',
  '!',
  '((((',
  '<->',
])('the text %j in any filter does nothing but filter', async (text) => {
  for (const key of ['words', 'field', 'tag', 'keeper', 'cursor', 'sort', 'state', 'limit', 'degree', 'verdict']) {
    const answer = await get(`${path}?${new URLSearchParams({ [key]: text }).toString()}`, room.token);
    expect([200, 422], `${key}: ${answer.text}`).toContain(answer.status);
    expect(answer.type).toMatch(/^application\/(problem\+)?json$/);
  }
  expect((await get(path, room.token)).body).toMatchObject({ total: 1 });
});

test('a key that is given twice, or is one of JavaScript’s own, does no harm', async () => {
  expect((await get(`${path}?limit=1&limit=2`, room.token)).status).toBe(200);
  expect((await get(`${path}?__proto__=1`, room.token)).body).toMatchObject({ total: 1 });
  for (const key of ['constructor', 'toString', 'hasOwnProperty'])
    expect((await get(`${path}?${key}=1`, room.token)).status).toBe(422);
});

test('other methods are told what answers here', async () => {
  const answer = await post(path, 'x', { 'x-http-method-override': 'DELETE' });
  expect(answer.status).toBe(401);
});
