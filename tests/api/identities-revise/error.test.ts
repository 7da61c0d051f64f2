import { beforeEach, expect, test } from 'vitest';
import { get, post } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { kept, newRoom, type Room, sample } from '../batteries/room';

const path = '/api/v1/identities/{key}/revisions';
let room: Room;
let key: string;

beforeEach(async () => {
  room = await newRoom();
  ({ key } = await kept(room));
});

const ask = (change: Record<string, unknown>) =>
  post(path.replace('{key}', key), { ...sample, base: 1, ...change }, room.token);

test('two screens: the second revision of the same one is a conflict that shows the first', async () => {
  const both = await Promise.all([ask({ name: 'First' }), ask({ name: 'Second' })]);
  expect(both.map(({ status }) => status).sort()).toEqual([201, 409]);
  const lost = both.find(({ status }) => status === 409);
  const won = both.find(({ status }) => status === 201);
  if (lost === undefined || won === undefined) throw new Error('One of two is kept.');
  await expectProblem(path, lost, 409, 'conflict', { current: won.body as object });
  expect((await get(`/api/v1/identities/${key}`, room.token)).body).toEqual(won.body);
});

test.each([[2], [999]])('the base %j is a conflict', async (base) => {
  await expectProblem(path, await ask({ base }), 409, 'conflict', {
    current: expect.objectContaining({ key }) as object,
  });
});

test.each([
  [{ base: undefined }, 'invalid', 'base'],
  [{ base: 0 }, 'invalid', 'base'],
  [{ base: 1.5 }, 'invalid', 'base'],
  [{ base: '1' }, 'invalid', 'base'],
  [{ change: '' }, 'invalid', 'change'],
  [{ change: 'two\nlines' }, 'invalid', 'change'],
  [{ visibility: 'public' }, 'invalid', 'visibility'],
  [{ statement: '[a' }, 'syntax', 'statement'],
  [{ kind: 'residue', field: 'Q', statement: '[7]', hypotheses: [], place: '7', value: '[' }, 'syntax', 'value'],
])('%j is refused as %s at %s', async (change, code, part) => {
  await expectProblem(path, await ask(change), 422, code, { part });
});

test('a revision that is not as it says changes nothing', async () => {
  await expectProblem(path, await ask({ statement: '[a] = [b]' }), 422, 'sides-differ');
  await expectProblem(path, await ask({ warning: true }), 422, 'sides-agree');
  expect((await get(`/api/v1/identities/${key}`, room.token)).body).toMatchObject({ current: 1, state: 'checked' });
});
