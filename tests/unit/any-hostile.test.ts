import { describe, expect, test } from 'vitest';
import type { Budget } from '@/engine/arith/budget';
import { compare } from '@/engine/decide/compare';
import { Refusal } from '@/engine/expression/refusal';
import { readStatement } from '@/grammar/read';
import { field } from '../property/kmw-engine';

const many = (count: number, write: (i: number) => string, separator = ''): string =>
  Array.from({ length: count }, (_, i) => write(i + 1)).join(separator);

/** Ends a computation after so many steps, as a clock would. */
function stepping(most: number): Budget {
  let left = most;
  return {
    spend(doing) {
      left -= 1;
      if (left < 0) throw new Refusal('budget', `Stopped while ${doing}.`);
    },
  };
}

/** The verdict, or why there is none. */
function outcome(text: string, steps: number): string {
  const { sides, conditions } = readStatement(text);
  const [left, right] = sides;
  if (left === undefined || right === undefined) throw new Error('no equality');
  try {
    return compare(field('any'), left, right, conditions, stepping(steps)).verdict;
  } catch (error) {
    if (error instanceof Refusal) return error.code;
    throw error;
  }
}

describe('statements over any field that ask for too much', () => {
  test.each([
    ['a sum of many letters', `[${many(60, (i) => `x${i}`, '+')}][a] = 0`],
    ['many sums in letters of their own', `${many(60, (i) => `[x${i}+y${i}]`)} = 0`],
    ['many lines', `${many(40, (i) => `[a+${i}b]`)} = 0`],
    ['many forms', `${many(200, (i) => `<x${i}+x${i + 1}>`, '+')} = 0`],
    ['a high power of a sum beside a high degree', '[(a+b)^9999][a^9999+1] = 0'],
    ['high degrees', '[a^10000+b^9999+1][a^7777-b^3+2][a+b] = 0'],
    ['a high power of a word', '([a+b]+[a-b]+[1-c]eta[b])^64 = 0'],
    ['many terms', `[${many(300, (i) => `a^${i}b^${301 - i}`, '+')}][a] = 0`],
    ['powers that do not cancel', '[(a+b)^60+(b+c)^60][(a-c)^50+1] = 0'],
    ['powers of powers', '[((a+b)^20+c)^20+1] = 0'],
    ['large numbers', `[${'7'.repeat(5000)}a+b][a] = 0`],
    ['cyclotomic factors', '[a^2000-b^2000][a^1999-b] = 0'],
    ['a large characteristic', `[(a+b)^50+1][1+c] = [a]; char = ${2n ** 127n - 1n}`],
  ])('%s: end with a verdict, or with the limit that was reached', (_, text) => {
    expect(['equal', 'different', 'undecided', 'budget', 'size']).toContain(outcome(text, 2_000));
  });

  test('what passes a limit on size is refused for that', () => {
    expect(outcome('[((a+b)^20+c)^20+1] = 0', 2_000)).toBe('size');
  });

  test('a budget that is spent ends it at once', () => {
    for (const steps of [0, 1, 10, 100]) expect(outcome('[a^2000-b^2000][a^1999-b] = 0', steps)).toBe('budget');
  });
});
