import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Element } from '@/engine/expression/element';
import { Refusal } from '@/engine/expression/refusal';
import { elementText } from '@/engine/expression/to-text';
import { readCondition } from '@/grammar/read';
import { canonicalText, verdict } from './kmw-engine';
import { fieldRow, monomialUnit } from './kmw-fields';
import { editedPair, equalPair } from './kmw-statements';
import { substitute } from './kmw-words';

const row = { ...fieldRow('any'), unit: monomialUnit(['a', 'b', 'x']) };

/** Hypotheses over an unspecified field: a letter that is solved for is a letter that was replaced. */
describe('hypotheses', () => {
  it('a = a product of other letters is a substitution', () => {
    const value = monomialUnit(['b', 'x', 'y']);
    const counts = { equal: 0, different: 0, undecided: 0 };
    fc.assert(
      fc.property(fc.oneof(equalPair(row), editedPair(row)), value, ({ left, right }, m: Element) => {
        const condition = readCondition(`a = ${elementText(m)}`);
        const at = new Map([['a', m]]);
        const judged = verdict('any', left, right, [condition]);
        expect(judged).toBe(verdict('any', substitute(left, at), substitute(right, at)));
        expect(canonicalText('any', left, [condition])).toBe(canonicalText('any', substitute(left, at)));
        counts[judged] += 1;
      }),
      { numRuns: 60 },
    );
    expect(Math.min(counts.equal, counts.different)).toBeGreaterThan(4);
  });

  it('an equality stays one under any hypothesis, and under its own letters made equal', () => {
    fc.assert(
      fc.property(equalPair(row), ({ left, right }) => {
        for (const text of ['a = b', 'ab = x', 'a = 1', 'a = -1', 'a != b', 'char = 3', 'char != 2', 'x = 1/a'])
          expect(verdict('any', left, right, [readCondition(text)]), text).toBe('equal');
      }),
      { numRuns: 25 },
    );
  });

  it.each([
    ['[a]', '0', 'a = 1', 'equal'],
    ['[a]', '0', 'a = -1', 'different'],
    ['[a]', '[b]', 'a = b', 'equal'],
    ['[a]', '-[b]', 'ab = 1', 'different'],
    ['[a]', '-<b>[b]', 'ab = 1', 'equal'],
    ['[a][b]', '-[b][a]', 'char = 5', 'equal'],
    ['[a][b]', '-[b][a]', 'char != 5', 'different'],
    ['[a][b]', '-[b][a]', 'char != 2', 'different'],
    ['[-1]', '0', 'char = 2', 'equal'],
    ['[a]', '[2]', 'a = 2', 'equal'],
    ['[a][-1]', '0', 'a = 2', 'equal'],
  ])('%s = %s ; %s', (left, right, condition, expected) => {
    expect(verdict('any', left, right, [readCondition(condition)])).toBe(expected);
  });

  it.each([
    ['any', 'char = 6'],
    ['any', 'a != a'],
    ['any', 'a^2 = b^2'],
    ['Q', '2 = 3'],
    ['F_7', 'char = 5'],
    ['F_7', '7 != 0'],
  ])('over %s, %s is refused', (name, condition) => {
    expect(() => verdict(name, '[2]', '[2]', [readCondition(condition)])).toThrow(Refusal);
  });

  it.each([
    ['F_7', 'char = 7'],
    ['F_7', '8 = 1'],
    ['F_9', 'z^2 = -1'],
    ['Q', '2 != 3'],
  ])('over %s, %s holds', (name, condition) => {
    expect(verdict(name, '<1>', '1', [readCondition(condition)])).toBe('equal');
  });
});
