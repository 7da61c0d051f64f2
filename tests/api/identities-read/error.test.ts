import { beforeAll, test } from 'vitest';
import { get } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { kept, newRoom, type Room } from '../batteries/room';

const described = '/api/v1/identities/{key}';
let room: Room;
let address: string;

beforeAll(async () => {
  room = await newRoom();
  address = `/api/v1/identities/${(await kept(room)).key}`;
});

test('a revision that was never made is not there', async () => {
  await expectProblem(described, await get(`${address}?revision=2`, room.token), 404, 'not-found', {}, 'get');
  await expectProblem(described, await get(`${address}?revision=999999999`, room.token), 404, 'not-found', {}, 'get');
});

test.each(['0', '-1', 'x', '', '1.5', '9999999999', '1;'])('%j is no number of a revision', async (revision) => {
  const answer = await get(`${address}?${new URLSearchParams({ revision }).toString()}`, room.token);
  await expectProblem(described, answer, 422, 'invalid', { part: 'revision' }, 'get');
});

test('an unknown key in the query string is named', async () => {
  await expectProblem(described, await get(`${address}?rev=1`, room.token), 422, 'invalid', { part: 'rev' }, 'get');
});
