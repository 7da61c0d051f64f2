import { expect, test } from 'vitest';
import { post } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { transportBattery } from '../batteries/transport';

const path = '/api/v1/compare';
const body = { field: 'Q', left: '[2][-1]', right: '[-1][2]' };

transportBattery(path, { body });

test('towers of powers end at a size limit', async () => {
  const answer = await post(path, { field: 'Q', left: '(((2^64)^64)^64)^64', right: '1' });
  await expectProblem(path, answer, 503, 'size');
});

test('a statement of many steps is judged or refused, step by step', async () => {
  const answer = await post(path, { field: 'Q', statement: Array.from({ length: 500 }, () => '[2]').join('=') });
  expect(answer.status).toBe(200);
  expect(answer.body).toMatchObject({ verdict: 'equal' });
});

test('more hypotheses than are allowed are refused before they are read', async () => {
  const answer = await post(path, { ...body, hypotheses: Array.from({ length: 51 }, () => '2 != 3') });
  await expectProblem(path, answer, 422, 'invalid', { part: 'hypotheses' });
});
