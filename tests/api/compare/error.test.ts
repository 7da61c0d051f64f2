import { expect, test } from 'vitest';
import { post } from '../../harness/http';
import { expectProblem } from '../batteries/described';

const path = '/api/v1/compare';

test('each side keeps its own lines and columns', async () => {
  const left = await post(path, { field: 'Q', left: '[2', right: '[3]' });
  await expectProblem(path, left, 422, 'syntax', { part: 'left', line: 1, column: 3 });
  const right = await post(path, { field: 'Q', left: '[2]', right: '[3]\n+[' });
  await expectProblem(path, right, 422, 'syntax', { part: 'right', line: 2, column: 3 });
});

test('an entry that is zero is placed on its side', async () => {
  for (const [left, right, part] of [
    ['[0]', '[2]', 'left'],
    ['[2]', '[0]', 'right'],
  ]) {
    const answer = await post(path, { field: 'Q', left, right });
    await expectProblem(path, answer, 422, 'not-a-unit', { part, line: 1, column: 2, excerpt: '[0]\n ^' });
  }
  const statement = await post(path, { field: 'Q', statement: '[2] = [0]' });
  await expectProblem(path, statement, 422, 'not-a-unit', { part: 'statement', column: 8 });
});

test('a tower of exponents in a statement cannot be read', async () => {
  await expectProblem(path, await post(path, { field: 'Q', statement: '[64] = [2^3^2]' }), 422, 'syntax', {
    part: 'statement',
  });
});

test('an expression is no statement', async () => {
  const answer = await post(path, { field: 'Q', statement: '[2]' });
  await expectProblem(path, answer, 422, 'invalid', { part: 'statement' });
  expect(answer.body).toMatchObject({ detail: expect.stringContaining('/api/v1/normalize') as unknown });
});

test.each([
  [{ left: '[2]', right: '[2]' }],
  [{ field: 'Q', left: '[2]' }],
  [{ field: 'Q' }],
  [{ field: 'Q', left: '[2]', right: '[2]', statement: '[2]=[2]' }],
  [{ field: 'Q', left: '[2]', right: null }],
  [{ field: 'Q', left: '[2]', right: '[2]', forms: 'yes' }],
  [{ field: 'Q', left: '[2]', right: '[2]', hypotheses: 'a != 1' }],
])('%j has the wrong shape', async (body) => {
  await expectProblem(path, await post(path, body), 422, 'invalid');
});
