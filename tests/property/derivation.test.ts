import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { compare } from '@/engine/decide/compare';
import { normalize } from '@/engine/decide/normalize';
import { resolveField } from '@/engine/decide/registry';
import { expressionText } from '@/engine/expression/to-text';
import { readExpression, readFieldName } from '@/grammar/read';

// A derivation is a chain of equalities: every line must equal the one above it, by the homomorphisms that decide equality and
// know nothing of the rewriting rules; the last line is the canonical form.

const fields: Record<string, readonly string[]> = {
  Q: ['2', '-1', '3', '6', '-12', '5/4', '1/3', '1'],
  R: ['2', '-1', '-6', '4', '1/3'],
  C: ['2', '-1', '6'],
  Q_2: ['2', '-1', '3', '-5', '6'],
  Q_5: ['5', '-1', '2', '10', '1/5'],
  F_2: ['1'],
  F_7: ['1', '2', '3', '6'],
  F_9: ['z', 'z+1', '2', '1'],
  F_13: ['2', '5', '12', '1'],
  any: ['a', 'b', '-a', 'a*b', 'a^2', '1/b', '-1', 'a^-3*b', 'c'],
};

const word = (entries: readonly string[]): fc.Arbitrary<string> => {
  const entry = fc.constantFrom(...entries);
  const letter = fc.oneof(
    { weight: 4, arbitrary: entry.map((a) => `[${a}]`) },
    { weight: 1, arbitrary: entry.map((a) => `<${a}>`) },
    { weight: 1, arbitrary: entry.map((a) => `<<${a}>>`) },
    { weight: 2, arbitrary: fc.constantFrom('eta', 'h', 'eps', '3_eps', '(-2)_eps') },
  );
  return fc
    .tuple(fc.integer({ min: -3, max: 3 }), fc.array(letter, { minLength: 1, maxLength: 3 }))
    .map(([c, letters]) => `(${c})*${letters.join('*')}`);
};

describe.each(Object.entries(fields))('over %s', (name, entries) => {
  const field = resolveField(readFieldName(name), unlimited);

  test('every line of a derivation equals the one above it, and the last is the canonical form', () => {
    fc.assert(
      fc.property(fc.array(word(entries), { minLength: 1, maxLength: 2 }), (words) => {
        const expression = readExpression(words.join(' + '));
        const { parts, steps } = normalize(field, expression, { steps: true }, unlimited);
        fc.pre(steps !== undefined); // left out only where it would be too long to read
        let line = expression;
        for (const step of steps) {
          expect(expressionText(step.before)).toBe(expressionText(line));
          expect([step.relation, compare(field, step.before, step.after, [], unlimited).verdict]).toEqual([
            step.relation,
            'equal',
          ]);
          line = step.after;
        }
        const form = parts.map(({ normalForm }) => expressionText(normalForm)).join(' + ') || '0';
        expect(compare(field, line, readExpression(form), [], unlimited).verdict).toBe('equal');
        if (steps.length > 0) expect(normalize(field, line, {}, unlimited).parts.length).toBe(parts.length);
      }),
      { numRuns: 50 },
    );
  });
});

test('the same derivation under a condition on the characteristic', () => {
  const field = resolveField(readFieldName('any'), unlimited);
  const conditions = [{ kind: 'characteristic', is: true, prime: 5n }] as const;
  const { steps = [] } = normalize(
    field,
    readExpression('[b][a*b^-3] + [-1][a]'),
    { steps: true, conditions },
    unlimited,
  );
  expect(steps.length).toBeGreaterThan(1);
  for (const { before, after } of steps)
    expect(compare(field, before, after, conditions, unlimited).verdict).toBe('equal');
});

test('a derivation that would be too long to read is left out, the canonical form is not', () => {
  const field = resolveField(readFieldName('Q'), unlimited);
  const { parts, steps } = normalize(
    field,
    readExpression('1 + ([2]+[3]+[5]+[7])^20*eta^20'),
    { steps: true },
    unlimited,
  );
  expect(parts.map(({ degree }) => degree)).toEqual([0]);
  expect(steps).toBeUndefined();
});
