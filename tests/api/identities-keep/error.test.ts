import { beforeAll, expect, test } from 'vitest';
import { get, post } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { newRoom, type Room, sample } from '../batteries/room';

const path = '/api/v1/identities';
let room: Room;

beforeAll(async () => {
  room = await newRoom();
});

const ask = (change: Record<string, unknown>, headers: Record<string, string> = {}) =>
  post(path, { ...sample, ...change }, { ...room.token, ...headers });

test('what is different is not kept', async () => {
  const answer = await ask({ field: 'Q', statement: '[6] = [2] + [3]', hypotheses: [] });
  await expectProblem(path, answer, 422, 'sides-differ');
  await expectProblem(path, await ask({ warning: true }), 422, 'sides-agree', { part: 'warning' });
  expect((await get(path, room.token)).body).toMatchObject({ total: 0 });
});

test.each([
  [{ statement: '[a][1+a = 0' }, 'syntax', 'statement'],
  [{ hypotheses: ['a !='] }, 'syntax', 'hypotheses[0]'],
  [{ field: 'Q(' }, 'syntax', 'field'],
  [{ statement: '[a]' }, 'invalid', 'statement'],
  [{ field: 'F_6' }, 'field', 'field'],
  [{ field: 'Q', statement: '[0] = 0', hypotheses: [] }, 'not-a-unit', 'statement'],
  [{ field: 'Q', statement: '[1/0] = 0', hypotheses: [] }, 'division-by-zero', 'statement'],
  [{ field: 'Q', statement: '[b] = 0', hypotheses: [] }, 'unknown-letter', 'statement'],
  [{ place: '7' }, 'invalid', 'place'],
  [{ uniformizer: '7' }, 'invalid', 'uniformizer'],
  [{ value: '7' }, 'invalid', 'value'],
  [{ kind: 'residue', hypotheses: [], statement: '[7]', field: 'Q', value: '1' }, 'invalid', 'place'],
  [{ kind: 'residue', hypotheses: [], statement: '[7]', field: 'Q', place: '7' }, 'invalid', 'value'],
  [{ kind: 'residue', statement: '[7]', field: 'Q', place: '7', value: '1' }, 'invalid', 'hypotheses'],
  [{ kind: 'residue', hypotheses: [], statement: '[7]', field: 'Q', place: '6', value: '1' }, 'place', 'place'],
  [{ name: '' }, 'invalid', 'name'],
  [{ name: undefined }, 'invalid', 'name'],
  [{ name: 7 }, 'invalid', 'name'],
  [{ tags: ['-first'] }, 'invalid', 'tags[0]'],
  [{ tags: ['two words'] }, 'invalid', 'tags[0]'],
  [{ doi: '11.1000/x' }, 'invalid', 'doi'],
  [{ arxiv: '2313.01234' }, 'invalid', 'arxiv'],
  [{ warning: 'yes' }, 'invalid', 'warning'],
])('%j is refused as %s at %s', async (change, code, part) => {
  await expectProblem(path, await ask(change), 422, code, { part });
});

test('a key that came with another request, or is none, is refused', async () => {
  const headers = { 'idempotency-key': 'once' };
  expect((await ask({}, headers)).status).toBe(201);
  await expectProblem(path, await ask({ name: 'Another' }, headers), 422, 'idempotency-key');
  for (const key of ['', 'x'.repeat(201), 'é'])
    await expectProblem(path, await ask({}, { 'idempotency-key': key }), 422, 'idempotency-key');
});

test('what the engine does not decide, or not within its limits, is a draft and no problem', async () => {
  const refusal = await ask({ field: 'Q(s)(t)', statement: '[t][1-t] = 0', hypotheses: [] });
  expect(refusal).toMatchObject({ status: 201, body: { state: 'draft', lastCheck: { verdict: 'refused' } } });
  const stopped = await ask({ field: 'Q', statement: '[(((2^64)^64)^64)^64] = [3]', hypotheses: [] });
  expect(stopped).toMatchObject({ status: 201, body: { state: 'draft', lastCheck: { verdict: 'stopped' } } });
});
