import { expect, test } from 'vitest';
import { identityAnswer } from '@/lib/contracts/identity-answer';
import { get, post } from '../../harness/http';
import { expectDescribed } from '../batteries/described';
import { kept, newRoom, sample } from '../batteries/room';

const described = '/api/v1/identities/{key}';
const path = '/api/v1/identities';

test('an identity with its revisions, its checks and the evidence', async () => {
  const room = await newRoom();
  const { key } = await kept(room);
  const answer = await get(`${path}/${key}`, room.token);
  expect(answer).toMatchObject({ status: 200, type: 'application/json' });
  await expectDescribed('get', described, answer);
  expect(identityAnswer.parse(answer.body)).toMatchObject({
    key,
    revision: 1,
    current: 1,
    statement: { text: sample.statement, tex: '[a][a] = [-1][a]' },
    hypotheses: [{ text: 'a != 1', tex: 'a \\ne 1' }],
    revisions: [{ number: 1 }],
    checks: [{ revision: 1, verdict: 'equal' }],
    evidence: { compare: { verdict: 'equal', parts: [{ degree: 2 }] } },
  });
});

test('an earlier revision stays as it was', async () => {
  const room = await newRoom();
  const { key } = await kept(room);
  await post(`${path}/${key}/revisions`, { ...sample, base: 1, name: 'Other name' }, room.token);
  expect((await get(`${path}/${key}`, room.token)).body).toMatchObject({ revision: 2, current: 2, name: 'Other name' });
  const first = await get(`${path}/${key}?revision=1`, room.token);
  expect(first.body).toMatchObject({ revision: 1, current: 2, name: sample.name });
});

test('a public one is read by anyone', async () => {
  const room = await newRoom();
  const { key } = await kept(room, { visibility: 'public' });
  const visitor = await get(`${path}/${key}`);
  expect(visitor.status).toBe(200);
  expect(visitor.body).toEqual((await get(`${path}/${key}`, room.token)).body);
  expect((await get(`${path}/${key}`, (await newRoom()).token)).body).toEqual(visitor.body);
});
