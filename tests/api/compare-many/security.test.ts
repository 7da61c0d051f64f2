import { expect, test } from 'vitest';
import { compareManyAnswer } from '@/lib/contracts/compare-many';
import { post } from '../../harness/http';
import { transportBattery } from '../batteries/transport';

const path = '/api/v1/compare/many';

transportBattery(path, { body: { compares: [{ field: 'Q', left: '[2][-1]', right: '[-1][2]' }] } });

test('keys inside a question are held as strictly as alone', async () => {
  const text =
    '{"compares":[{"field":"Q","statement":"1=1","__proto__":{"polluted":1}},{"field":"Q","statement":"1=1"}]}';
  const answer = await post(path, JSON.parse(text) as unknown);
  const { answers } = compareManyAnswer.parse(answer.body);
  expect(answers.map(({ status }) => status)).toEqual([422, 200]);
});

test('one that stops at a limit does not take the others with it', async () => {
  const tower = { field: 'Q', left: '(((2^64)^64)^64)^64', right: '1' };
  const short = { field: 'Q', left: '[2]', right: '[2]' };
  const { answers } = compareManyAnswer.parse((await post(path, { compares: [tower, short, tower, short] })).body);
  expect(answers.map(({ status }) => status)).toEqual([503, 200, 503, 200]);
});
