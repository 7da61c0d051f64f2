import { expect, test } from 'vitest';
import { type Answer, get, send } from '../../harness/http';
import { newGroup } from '../../harness/people';
import { forgetAttempts, newAccount, sessionOf } from '../../harness/sign-in';
import { expectProblem } from '../batteries/described';

const path = '/api/v1/token';
const problem = (answer: Answer, status: number, code: string) => expectProblem(path, answer, status, code, {}, 'get');

test('a caller without a token is told to bring one', async () => {
  const answer = await get(path);
  await problem(answer, 401, 'unauthenticated');
  expect(answer.headers.get('www-authenticate')).toBe('Bearer');
});

test('a session has no token to tell about', async () => {
  await forgetAttempts('sign-in-address');
  const { person } = await newAccount(await newGroup(), 'steward');
  await problem(await get(path, { cookie: await sessionOf(person.email) }), 404, 'not-found');
});

test.each(['POST', 'PUT', 'PATCH', 'DELETE'])('%s is told to use GET', async (method) => {
  const answer = await send(path, { method });
  expect(answer).toMatchObject({ status: 405, type: 'application/problem+json', body: { code: 'method' } });
  expect(answer.headers.get('allow')).toBe('GET, HEAD, OPTIONS');
});
