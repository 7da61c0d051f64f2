import { expect, test } from 'vitest';
import { identityAnswer } from '@/lib/contracts/identity-answer';
import { get, post } from '../../harness/http';
import { newMember, tokenOf } from '../../harness/people';
import { expectDescribed } from '../batteries/described';
import { newRoom, sample } from '../batteries/room';

const path = '/api/v1/identities';

test('an identity is kept, and found under its key', async () => {
  const { token, group } = await newRoom();
  const answer = await post(path, { ...sample, doi: 'doi:10.1000/x', tags: ['A', 'a', ' b '] }, token);
  expect(answer).toMatchObject({ status: 201, type: 'application/json' });
  await expectDescribed('post', path, answer);
  const identity = identityAnswer.parse(answer.body);
  expect(identity).toMatchObject({
    key: `${group.slug}-1`,
    state: 'checked',
    visibility: 'group',
    doi: '10.1000/x',
    tags: ['a', 'b'],
    keeper: 'Tobias Renk',
    lastCheck: { verdict: 'equal' },
  });
  expect((await get(`${path}/${identity.key}`, token)).body).toEqual(answer.body);
});

test('public from the beginning, and as a warning', async () => {
  const { token } = await newRoom();
  const given = {
    name: 'Six as a product',
    field: 'Q',
    statement: '[6] = [2] + [3]',
    warning: true,
    visibility: 'public',
  };
  const answer = await post(path, given, token);
  expect(answer).toMatchObject({ status: 201, body: { warning: true, visibility: 'public', state: 'checked' } });
  const { key } = answer.body as { key: string };
  expect((await get(`${path}/${key}`)).status).toBe(200);
});

test('a residue', async () => {
  const { token } = await newRoom();
  const given = { name: 'At seven', kind: 'residue', field: 'Q', statement: '[7][5]', place: '7', value: '[5]' };
  const answer = await post(path, given, token);
  await expectDescribed('post', path, answer);
  expect(answer).toMatchObject({ status: 201, body: { kind: 'residue', state: 'checked', place: { text: '7' } } });
});

test('every role from author on keeps', async () => {
  const { group } = await newRoom();
  for (const role of ['author', 'reviewer', 'steward'] as const)
    expect((await post(path, sample, await tokenOf(await newMember(group, role)))).status).toBe(201);
});

test('under an Idempotency-Key the same request makes one identity, in whatever order its keys come', async () => {
  const { token } = await newRoom();
  const headers = { ...token, 'idempotency-key': 'night run, line 1' };
  const first = await post(path, sample, headers);
  const turned = Object.fromEntries(Object.entries(sample).reverse());
  const second = await post(path, turned, headers);
  expect([first.status, second.status]).toEqual([201, 201]);
  expect(second.body).toEqual(first.body);
  const many = await Promise.all(
    Array.from({ length: 6 }, () => post(path, sample, { ...headers, 'idempotency-key': 'race' })),
  );
  expect(new Set(many.map(({ status }) => status))).toEqual(new Set([201]));
  expect(new Set(many.map(({ body }) => (body as { key: string }).key)).size).toBe(1);
  expect((await get(path, token)).body).toMatchObject({ total: 2 });
});
