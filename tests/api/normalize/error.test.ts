import { expect, test } from 'vitest';
import { post } from '../../harness/http';
import { expectProblem } from '../batteries/described';

const path = '/api/v1/normalize';
const ask = (field: string, expression: string) => post(path, { field, expression });

test.each([
  ['[2,]', 1, 4],
  ['[]', 1, 2],
  ['[2]+*[3]', 1, 5],
  ['[2]\n+ @', 2, 3],
  ['[(2]', 1, 4],
  ['[2', 1, 3],
])('%j cannot be read, at line %i, column %i', async (expression, line, column) => {
  const answer = await ask('Q', expression);
  await expectProblem(path, answer, 422, 'syntax', { part: 'expression', line, column });
  expect(answer.body).toMatchObject({ excerpt: expect.stringContaining('^') as unknown });
});

test('a text is read before its field is looked at', async () => {
  await expectProblem(path, await ask('F_6', '[2'), 422, 'syntax', { part: 'expression' });
  await expectProblem(path, await ask('F_6', '[2]'), 422, 'field');
});

test.each(['F_6', 'F_1', 'F_9(z)', 'F_3[z]/(0)', 'F_9[z]/(z^2+z+1)', 'F_9[y]/(y^2-1)', 'Q_4'])(
  'there is no field %s',
  async (field) => {
    const answer = await ask(field, '1');
    expect(answer.status).toBe(422);
    expect(['field', 'syntax']).toContain((answer.body as { code: string }).code);
  },
);

test.each([
  ['Q', '[0]', 1, 2],
  ['Q', '<0>', 1, 2],
  ['Q', '[2]+[1-1]', 1, 6],
  ['F_9', '[z^2+1]', 1, 2],
  ['F_2', '[2]', 1, 2],
])('over %s the entry in %s is zero', async (field, expression, line, column) => {
  await expectProblem(path, await ask(field, expression), 422, 'not-a-unit', { part: 'expression', line, column });
});

test('a denominator that is zero in the field, and a letter it does not have', async () => {
  await expectProblem(path, await ask('F_7', '[1/7]'), 422, 'division-by-zero');
  await expectProblem(path, await ask('Q', '[a]'), 422, 'unknown-letter', { column: 2 });
});

test.each(['Q(s)(t)', 'Q[w]/(w^2-5)(t)'])('%s is understood and not decided', async (field) => {
  await expectProblem(path, await ask(field, '[2]'), 422, 'not-yet');
});

test('an equation is sent on to compare', async () => {
  const answer = await ask('Q', '[2] = [3]');
  await expectProblem(path, answer, 422, 'invalid', { part: 'expression' });
  expect(answer.body).toMatchObject({ detail: expect.stringContaining('/api/v1/compare') as unknown });
});

test('keys that are missing, unknown or of another type are named', async () => {
  await expectProblem(path, await post(path, { expression: '[2]' }), 422, 'invalid', { part: 'field' });
  await expectProblem(path, await post(path, { field: 'Q', expresion: '[2]' }), 422, 'invalid', {
    errors: [
      { key: 'expression', detail: 'The key “expression” is missing.' },
      { key: 'expresion', detail: 'There is no key “expresion” here.' },
    ],
  });
  await expectProblem(path, await post(path, { field: 'Q', expression: 2 }), 422, 'invalid', { part: 'expression' });
});

test('a hypothesis that cannot be read names its place in the list', async () => {
  const answer = await post(path, { field: 'any', expression: '[a]', hypotheses: ['a != 1', 'a !='] });
  await expectProblem(path, answer, 422, 'syntax', { part: 'hypotheses[1]' });
});
