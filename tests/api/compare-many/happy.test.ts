import { expect, test } from 'vitest';
import { compareManyAnswer, compareManyItem } from '@/lib/contracts/compare-many';
import { post } from '../../harness/http';
import { expectDescribed } from '../batteries/described';

const path = '/api/v1/compare/many';

test('answers come in order, each with its own status', async () => {
  const answer = await post(path, {
    compares: [
      { field: 'Q', left: '[6]', right: '[2]+[3]' },
      { field: 'Q', left: '[0]', right: '1' },
      { field: 'F_7', statement: '[3][5] = 0' },
      { field: 'Q', left: '[2' },
      null,
      { field: 'F_6', statement: '1 = 1' },
    ],
  });
  expect(answer).toMatchObject({ status: 200, type: 'application/json' });
  await expectDescribed('post', path, answer);
  const { answers } = compareManyAnswer.parse(answer.body);
  expect(answers.map((item) => ('answer' in item ? item.answer.verdict : item.problem.code))).toEqual([
    'different',
    'not-a-unit',
    'equal',
    'invalid',
    'invalid',
    'field',
  ]);
  expect(answers.map(({ status }) => status)).toEqual([200, 422, 200, 422, 422, 422]);
});

test('each answer is the one that compare gives', async () => {
  const body = { field: 'Q', left: '[6]', right: '[2]+[3]' };
  const many = compareManyAnswer.parse((await post(path, { compares: [body] })).body);
  expect(many.answers[0]).toEqual({ status: 200, answer: (await post('/api/v1/compare', body)).body });
});

test('five hundred are answered', async () => {
  const compares = Array.from({ length: 500 }, (_, index) => ({ field: 'Q', left: `[${index + 1}]`, right: '[7]' }));
  const { answers } = compareManyAnswer.parse((await post(path, { compares })).body);
  const equal = answers.flatMap((item, index) =>
    'answer' in item && item.answer.verdict === 'equal' ? [index + 1] : [],
  );
  expect(answers).toHaveLength(500);
  expect(equal).toEqual([7]);
  expect(compareManyItem.parse(answers[499])).toMatchObject({ status: 200 });
});
