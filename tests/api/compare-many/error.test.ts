import { test } from 'vitest';
import { post } from '../../harness/http';
import { expectProblem } from '../batteries/described';

const path = '/api/v1/compare/many';

test.each([
  ['no list', {}],
  ['another key', { statements: [] }],
  ['an empty list', { compares: [] }],
  ['501 questions', { compares: Array.from({ length: 501 }, () => ({ field: 'Q', statement: '1=1' })) }],
  ['an object for a list', { compares: { length: 1 } }],
])('%s is refused as a whole', async (_, body) => {
  await expectProblem(path, await post(path, body), 422, 'invalid');
});
