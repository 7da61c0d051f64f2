import { beforeEach, expect, test } from 'vitest';
import { get, post } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { kept, newRoom, type Room } from '../batteries/room';

const path = '/api/v1/identities/{key}/withdraw';
let room: Room;
let key: string;

beforeEach(async () => {
  room = await newRoom();
  ({ key } = await kept(room));
});

const ask = (change: Record<string, unknown> = {}) =>
  post(path.replace('{key}', key), { base: 1, reason: 'The sign is wrong.', ...change }, room.token);

test('from another revision, and a second time, it is a conflict', async () => {
  await expectProblem(path, await ask({ base: 2 }), 409, 'conflict');
  expect((await ask()).status).toBe(200);
  await expectProblem(path, await ask({ reason: 'Again.' }), 409, 'conflict', {
    current: expect.objectContaining({ withdrawnReason: 'The sign is wrong.' }) as object,
  });
});

test.each([
  [{ reason: undefined }, 'reason'],
  [{ reason: '' }, 'reason'],
  [{ reason: ' \n ' }, 'reason'],
  [{ reason: 'x'.repeat(501) }, 'reason'],
  [{ reason: 'a\0b' }, 'reason'],
  [{ base: undefined }, 'base'],
  [{ base: '1' }, 'base'],
  [{ state: 'withdrawn' }, 'state'],
])('%j is refused at %s, and nothing is changed', async (change, part) => {
  await expectProblem(path, await ask(change), 422, 'invalid', { errors: [expect.objectContaining({ key: part })] });
  expect((await get(`/api/v1/identities/${key}`, room.token)).body).toMatchObject({ state: 'checked' });
});
