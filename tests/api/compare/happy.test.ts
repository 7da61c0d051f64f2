import { expect, test } from 'vitest';
import { compareAnswer } from '@/lib/contracts/compare';
import { post } from '../../harness/http';
import { expectDescribed } from '../batteries/described';

const path = '/api/v1/compare';

async function compare(body: Record<string, unknown>) {
  const answer = await post(path, body);
  expect(answer).toMatchObject({ status: 200, type: 'application/json' });
  await expectDescribed('post', path, answer);
  return compareAnswer.parse(answer.body);
}

test('equal sides, with what was compared and why it suffices', async () => {
  const { verdict, parts, evidence, statement, sides } = await compare({
    field: 'Q',
    left: '[6]',
    right: '[2]+[3]+eta[2][3]',
  });
  expect(verdict).toBe('equal');
  expect(parts.map(({ degree }) => degree)).toEqual([1]);
  expect(parts[0]?.compared.every(({ same }) => same)).toBe(true);
  expect(parts[0]?.compared.map(({ place }) => place)).toEqual(expect.arrayContaining(['2', '3']));
  expect(evidence).toMatchObject({ kind: 'invariants', modEta: true, modH: true });
  expect(evidence.theorem).not.toBe('');
  expect(evidence.separating).toBeUndefined();
  expect(statement.text).toBe('[6] = [2] + [3] + eta[2][3]');
  expect(sides).toHaveLength(2);
});

test('different sides, with the first invariant that separates them', async () => {
  // [6] and [2] + [3] agree modulo η, for K^M_1 is the group of units, and differ by η[2][3].
  const { verdict, evidence, parts } = await compare({ field: 'Q', left: '[6]', right: '[2]+[3]' });
  expect(verdict).toBe('different');
  expect(evidence.modEta).toBe(true);
  expect(evidence.modH).toBe(false);
  expect(evidence.separating?.degree).toBe(1);
  expect(evidence.separating?.sentence).not.toBe('');
  expect(parts.some((part) => part.compared.some(({ same }) => !same))).toBe(true);
});

test('a statement says the same as its sides', async () => {
  const apart = await compare({ field: 'F_7', left: '[3][5]', right: '0' });
  expect(await compare({ field: 'F_7', statement: '[3][5] = 0' })).toEqual(apart);
});

test('a chain is judged step by step and the first wrong step is marked', async () => {
  const { verdict, chain, firstWrong, parts, evidence } = await compare({
    field: 'Q',
    statement: '[6] = [2]+[3]+eta[2][3] = [2]+[3] = [3]+[2]',
  });
  expect(verdict).toBe('different');
  expect(chain?.map((step) => step.verdict)).toEqual(['equal', 'different', 'equal']);
  expect(firstWrong).toBe(1);
  expect(parts).toEqual(chain?.[1]?.parts);
  expect(evidence).toEqual(chain?.[1]?.evidence);
});

test('a chain that holds is equal and marks nothing', async () => {
  const { verdict, chain, firstWrong } = await compare({ field: 'Q', statement: '[4] = 2_eps [2] = h [2]' });
  expect(verdict).toBe('equal');
  expect(chain).toHaveLength(2);
  expect(firstWrong).toBeUndefined();
});

test('canonical forms of both sides come when asked for', async () => {
  const { parts } = await compare({ field: 'Q', left: '[6]', right: '[2]+[3]', forms: true });
  expect(parts[0]?.forms?.left.canonical).toBe(true);
  expect(parts[0]?.forms?.left.text).not.toBe(parts[0]?.forms?.right.text);
  const same = await compare({ field: 'Q', left: '[6]', right: '[2]+[3]+eta[2][3]', forms: true });
  expect(same.parts[0]?.forms?.left).toEqual(same.parts[0]?.forms?.right);
});

test('asking for a certificate changes nothing where none is produced', async () => {
  const plain = await compare({ field: 'Q', left: '[2][-1]', right: '[-1][2]' });
  expect(await compare({ field: 'Q', left: '[2][-1]', right: '[-1][2]', certificate: true })).toEqual(plain);
});

test('everything shown can be typed again', async () => {
  const { sides, parts } = await compare({ field: 'Q', left: '[6][5] - 2<7>', right: '[2][5]+h eta^2[3]' });
  for (const { text } of [...sides, ...parts.flatMap(({ compared }) => compared.map(({ left }) => left))]) {
    expect((await post(path, { field: 'any', left: text, right: text })).status).not.toBe(500);
  }
});
