import { expect, test } from 'vitest';
import { normalizeAnswer } from '@/lib/contracts/normalize';
import { compareAnswer } from '@/lib/contracts/compare';
import { post } from '../../harness/http';
import { expectDescribed } from '../batteries/described';

const path = '/api/v1/normalize';

async function normalize(field: string, expression: string, more: Record<string, unknown> = {}) {
  const answer = await post(path, { field, expression, ...more });
  expect(answer).toMatchObject({ status: 200, type: 'application/json' });
  await expectDescribed('post', path, answer);
  return normalizeAnswer.parse(answer.body);
}

test('a word comes back by degree, in the group of that degree', async () => {
  const { parts, field, engine, expression, sideConditions } = await normalize('Q', '[2][-1] + 3[5][7] - \\eta[6]');
  expect(parts.map(({ degree, canonical }) => ({ degree, canonical }))).toEqual([
    { degree: 2, canonical: true },
    { degree: 0, canonical: true },
  ]);
  expect(parts[0]?.group.tex).toBe('K^{\\mathrm{MW}}_{2}(\\mathbb{Q})');
  expect(field).toEqual({ text: 'Q', tex: '\\mathbb{Q}' });
  expect(engine).toMatch(/^\d+\.\d+\.\d+$/);
  expect(expression.text).toBe('[2][-1] + 3[5][7] - eta[6]');
  expect(sideConditions).toEqual([]);
});

test.each(['Q', 'R', 'C', 'Q_2', 'Q_5', 'F_7', 'F_8', 'F_9', 'F_3[z]/(z^2+1)', 'F_9[y]/(y^2+z+1)'])(
  'over %s the canonical form reads back as the same class',
  async (field) => {
    const word = '[11][-1] + eta[13] - <-1> + 2 + eta^2 [11]';
    const { parts } = await normalize(field, word);
    const text = parts.map(({ normalForm }) => `(${normalForm.text})`).join(' + ') || '0';
    const verdict = await post('/api/v1/compare', { field, left: word, right: text });
    expect(compareAnswer.parse(verdict.body).verdict).toBe('equal');
  },
);

test('equal classes have equal canonical texts, different ones do not', async () => {
  const texts = async (expression: string) =>
    (await normalize('Q', expression)).parts.map((part) => part.normalForm.text);
  // Morel: [a][1-a] = 0, ηh = 0, [ab] = [a] + [b] + η[a][b].
  expect(await texts('[6]')).toEqual(await texts('[2]+[3]+eta[2][3]'));
  expect(await texts('[6]')).not.toEqual(await texts('[2]+[3]'));
});

test('zero has no parts', async () => {
  expect((await normalize('Q', '[5][-4]')).parts).toEqual([]);
  expect((await normalize('Q', 'eta h')).parts).toEqual([]);
});

test('TeX and Unicode are read like plain text', async () => {
  const plain = await normalize('Q', '[2][-1]+eta<3>');
  expect(await normalize('ℚ', '$[2][−1]+η⟨3⟩$')).toEqual(plain);
  expect(await normalize('\\mathbb{Q}', '[2][-1]+\\eta\\langle 3\\rangle')).toEqual(plain);
});

test('steps come when asked for, each with its relation, before and after', async () => {
  const { steps } = await normalize('Q', '[6]-[2]-[3]', { steps: true });
  expect(steps?.length).toBeGreaterThan(0);
  for (const [index, step] of (steps ?? []).entries()) {
    expect(step.relation).not.toBe('');
    if (index > 0) expect(step.before).toEqual(steps?.[index - 1]?.after);
  }
  expect((await normalize('Q', '[6]')).steps).toBeUndefined();
});

test('with letters the hypotheses become side conditions', async () => {
  const { sideConditions } = await normalize('any', '[a][b]', { hypotheses: ['a != 1'] });
  expect(sideConditions.length).toBeGreaterThan(0);
});
