import { beforeAll, test } from 'vitest';
import { get } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { newRoom, type Room } from '../batteries/room';

const path = '/api/v1/identities';
let room: Room;

beforeAll(async () => {
  room = await newRoom();
});

test.each([
  ['state=endorsed', 'invalid', 'state'],
  ['verdict=maybe', 'invalid', 'verdict'],
  ['sort=keeper', 'invalid', 'sort'],
  ['limit=0', 'invalid', 'limit'],
  ['limit=101', 'invalid', 'limit'],
  ['limit=ten', 'invalid', 'limit'],
  ['limit=1e1', 'invalid', 'limit'],
  ['limit=', 'invalid', 'limit'],
  ['degree=', 'invalid', 'degree'],
  ['degree=2.5', 'invalid', 'degree'],
  ['degree=99999999', 'invalid', 'degree'],
  ['tag=two+words', 'invalid', 'tag'],
  ['field=Q(', 'syntax', 'field'],
  ['field=', 'syntax', 'field'],
  ['cursor=x', 'invalid', 'cursor'],
  ['cursor=', 'invalid', 'cursor'],
  ['page=2', 'invalid', 'page'],
])('%s is refused as %s at %s', async (query, code, part) => {
  await expectProblem(path, await get(`${path}?${query}`, room.token), 422, code, { part }, 'get');
});
