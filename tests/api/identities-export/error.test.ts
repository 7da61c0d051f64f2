import { beforeAll, test } from 'vitest';
import { get } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { newRoom, type Room } from '../batteries/room';

const path = '/api/v1/identities/export';
let room: Room;

beforeAll(async () => {
  room = await newRoom();
});

test.each([
  ['format=pdf', 'invalid', 'format'],
  ['format=', 'invalid', 'format'],
  ['format=__proto__', 'invalid', 'format'],
  ['state=all', 'invalid', 'state'],
  ['field=Q(', 'syntax', 'field'],
  ['sort=name', 'invalid', 'sort'],
  ['limit=5', 'invalid', 'limit'],
])('%s is refused as %s at %s', async (query, code, part) => {
  await expectProblem(path, await get(`${path}?${query}`, room.token), 422, code, { part }, 'get');
});
