import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { elementText, expressionText } from '@/engine/expression/to-text';
import { expectVerdict, judge, verdict, whereDefined } from './kmw-engine';
import { fieldRow } from './kmw-fields';
import { atPlace } from './kmw-function-fields';

/** What is known of K_2 of residue fields of ℚ(t), and of number fields themselves. */
describe('K_2 of number fields', () => {
  it.each([
    ['Q(t)', '[t^2+1][t][1-t]', '0'],
    ['Q(t)', '[t^2-2][t/(t+3)][3/(t+3)]', '0'],
    ['Q(t)', '[t^3-2][5t][5t+1]', '[t^3-2][-1][1+5t]'],
    ['Q(t)', '[t^2+1][t+2][t+3]', '[t^2+1][t+3][t+2]'],
    ['Q[w]/(w^3-2)', '[w][1-w]', '0'],
    ['Q[w]/(w^2-5)', '[w+2][-w-1]', '0'],
  ])('over %s a Steinberg relation is found: %s = %s', (name, left, right) => {
    expectVerdict('equal', name, left, right);
    expect(verdict(name, left, right)).toBe('equal');
  });

  it.each([
    ['Q[w]/(w^2-5)', '[w*(w+1)][3]', '[w][3] + [w+1][3] + eta[w][w+1][3]', 'the product rule'],
    ['Q[w]/(w^2-5)', '[w*(w+1)][3]', '[w][3] + <w>[w+1][3]', 'twisted additivity'],
    ['Q[w]/(w^2-5)', '[5][3]', 'h[w][3]', '5 = w^2'],
    ['Q[w]/(w^2-5)', '[5][3]', '2[w][3]', 'modulo h both are 0 in I^3, where 3 is positive'],
    ['Q[w]/(w^3-2)', '[w^2][-1]', '2[w][-1] + eta[w][w][-1]', 'the product rule'],
    ['Q[w]/(w^3-2)', '[2][w]', '3_eps[w][w]', '2 = w^3'],
    ['Q[w]/(w^2+1)', '[-1][w]', '0', '[w^2][w] = h[w][w] = h[-1][w] = 0'],
    ['Q[w]/(w^2+1)', '[w][w]', '0', '[w][w] = [-1][w]'],
    ['Q[y]/(y^2+y+1)', '[y][-1]', '0', 'y = y^4, and h[-1] = 0'],
    ['Q(t)', '[t^2+1][-1][t]', '0', 'its residue is [-1][y], y^2 = -1'],
  ])('over %s products that are equal are used: %s = %s, by %s', (name, left, right) => {
    expect(verdict(name, left, right)).toBe('equal');
  });

  it.each([
    ['Q[w]/(w^2-5)', '[5][3]', '[w][3]'],
    ['Q[w]/(w^2-5)', '[5][3]', '3[w][3]'],
    ['Q[w]/(w^2+1)', '[-1][w+2]', '0'],
    ['Q[y]/(y^2+y+1)', '[y][2]', '0'], // y modulo 2 has order 3
  ])('over %s no product is taken for another: %s ≠ %s', (name, left, right) => {
    expect(verdict(name, left, right)).toBe('different');
  });

  it.each([
    ['Q(t)', '[t^2+1][2][3]', '0', '[2][3]'], // −1 in the field with 9 elements
    ['Q(t)', '[t^2+1][-1][3]', '0', '[-1][3]'],
    ['Q[s]/(s^2-2)', '[s+3][2]', '0', ''], // 2 is a square, and 2 modulo a prime above 7 is not 1
    ['Q[w]/(w^2+w+1)', '[2][5]', '0', ''],
  ])('over %s tame symbols separate: %s ≠ %s', (name, left, right, value) => {
    const { verdict: found, evidence } = judge(name, left, right);
    expect(found).toBe('different');
    if (value !== '') expect(expressionText(evidence.separating!.left)).toBe(value);
  });

  it('a statement that follows from the relations is never different', () => {
    for (const name of ['Q[w]/(w^2-5)', 'Q[w]/(w^3-2)', 'Q[w]/(w^2+7)']) {
      const { unit } = fieldRow(name);
      fc.assert(
        fc.property(unit, unit, (x, y) => {
          const [a, b] = [elementText(x), elementText(y)];
          const found = whereDefined(() => [
            verdict(name, `[${a}][1-(${a})]`, '0'),
            verdict(name, `[(${a})/((${a})+(${b}))][(${b})/((${a})+(${b}))]`, '0'),
            verdict(name, `[${a}][${b}]`, `[(${a})+(${b})][-(${b})/(${a})]`),
          ]);
          for (const judged of found ?? []) expect(judged).not.toBe('different');
        }),
        { numRuns: 12 },
      );
    }
  });
});

describe('classes with too many words', () => {
  const product = (letter: string, from: number, count: number): string =>
    Array.from({ length: count }, (_, i) => `(${letter}+${from + i})`).join('*');
  const [a, b] = [product('t', 1, 7), product('t', 8, 7)];
  const [x, y] = [product('y', 1, 7), product('y', 8, 7)];

  it.each([
    [`[t^2+1][${a}][${b}]`, `[${x}][${y}]`],
    [`eta[t^2+1][${a}][${b}]`, `eta[${x}][${y}]`],
    [`eta^2<t+3>[(t^2+1)^3][${a}][${b}]`, `eta^2<y+3>3_eps[${x}][${y}]`],
  ])('are shown as they stand: the residue of %s', (alpha, value) => {
    expect(verdict('Q(t)', alpha, '0')).toBe('different');
    const { answer, d } = atPlace('Q(t)', 't^2+1', alpha);
    expect(answer.zero).toBe(false);
    expectVerdict('equal', 'Q[y]/(y^2+1)', d, value);
  });

  it('are compared all the same', () => {
    expect(verdict('Q(t)', `eta[t^2+1][${a}][${b}]`, `eta[t^2+1][${b}][${a}]`)).toBe('equal');
    expect(verdict('Q(t)', `eta[t^2+1][${a}][${b}]`, `eta[t^2+1][${b}][(t-1)*${a}]`)).toBe('different');
  });
});
