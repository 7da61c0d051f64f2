import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Condition } from '@/engine/expression/statement';
import { expressionText } from '@/engine/expression/to-text';
import { readCondition, readExpression } from '@/grammar/read';
import { decidePrimeField, decideRational } from '../oracle/pull-back';
import { falsehoods, theorems, variations, type Claim } from './any-statements';
import { sumUnit } from './any-sums';
import { expectVerdict, judge, whereDefined } from './kmw-engine';
import { substitute, word } from './kmw-words';

const rows = (claims: readonly Claim[]): readonly (readonly [string, Claim])[] =>
  claims.map((claim) => [claim.name, claim] as const);

/** Verdicts of statements one sign away from a theorem that are equalities all the same. */
const trueVariations: readonly string[] = [
  'h[-a][1-a] = 0',
  'h[a][-1-a] = 0',
  'h[a][1+a] = 0',
  'h[-a][1+a] = 0',
  'h[a][-1+a] = 0',
  'h[a][1-a] = 0',
  'eta[-3][a^2-ab+b^2] = 0',
  'eta[+1][a^2+b^2] = 0',
  'eta[1][a^2+b^2] = 0',
  '[2][-a][-1][1-b] = 0',
  '[2][a][+1][1-b] = 0',
  '[2][a][1][1-b] = 0',
  '[2][a][-1][-1-b] = 0',
  '[2][a][-1][1+b] = 0',
];

/**
 * Judges a false statement and asks its counterexample by itself: the values put into the statement give what is asked over the field,
 * there the sides differ, and by the invariant that was named, with the same two values. Over ℚ and 𝔽_p the slow road agrees.
 */
function refuted(left: string, right: string, conditions: readonly Condition[] = []): ReturnType<typeof judge> {
  const outcome = judge('any', left, right, conditions);
  const { verdict, evidence } = outcome;
  const text = `${left} = ${right}`;
  expect(verdict, text).toBe('different');
  const { counterexample, separating } = evidence;
  if (counterexample === undefined) return outcome;
  expect(evidence.kind).toBe('counterexample');
  const { name } = counterexample.field;
  const [l, r] = counterexample.statement.sides;
  if (l === undefined || r === undefined) throw new Error('no equality');
  const values = new Map(counterexample.values.map(({ letter, value }) => [letter, value] as const));
  expectVerdict('equal', name, substitute(readExpression(left), values), l, counterexample.statement.conditions);
  expectVerdict('equal', name, substitute(readExpression(right), values), r, counterexample.statement.conditions);
  if (name !== 'any') {
    const there = judge(name, l, r);
    expect(there.verdict, text).toBe('different');
    expect(shown(there.evidence.separating)).toEqual(shown(separating));
  }
  if (name === 'Q') expect(decideRational('Q', l, r).equal, text).toBe(false);
  const prime = /^F_([0-9]+)$/.exec(name)?.[1];
  if (prime !== undefined && ['2', '3', '5', '7', '11', '13'].includes(prime))
    expect(decidePrimeField(BigInt(prime), l, r).equal, text).toBe(false);
  return outcome;
}

const shown = (separating: ReturnType<typeof judge>['evidence']['separating']): unknown =>
  separating && {
    degree: separating.degree,
    map: separating.map,
    place: separating.place,
    values: [separating.left, separating.right].map(expressionText),
  };

describe('what fails for some field', () => {
  it.each(rows(falsehoods))('%s', (_, { left, right }) => {
    const { evidence } = refuted(left, right);
    // symbols of degree 4 that are turned round differ in letters only
    expect(evidence.separating).toBeDefined();
    refuted(`[u](${left})<v> + [w]`, `[w] + [u](${right})<v>`);
  });

  it('and carries a field and values, with the invariant that separates them there', () => {
    const { evidence } = judge('any', '[a][b]', '[a+b][-ab]');
    const { counterexample, separating, tried } = evidence;
    expect(counterexample?.values.map(({ letter }) => letter)).toEqual(['a', 'b']);
    expect(separating?.sentence).toContain(`It fails over ${counterexample?.field.name} with a = `);
    expect(tried?.fields.map(({ field }) => field.name)).toContain(counterexample?.field.name);
  });
});

describe('one sign away from a theorem', () => {
  it.each(rows(theorems))('%s', (_, claim) => {
    for (const { left, right } of variations(claim)) {
      if (trueVariations.includes(`${left} = ${right}`)) expectVerdict('equal', 'any', left, right);
      else whereDefined(() => expect(refuted(left, right).evidence.kind).toBe('counterexample'));
    }
  });
});

describe('counterexamples obey the hypotheses', () => {
  it.each([
    ['[a][b]', '[a+b][-ab]', 'a+b != 0'],
    ['[a][b]', '[a+b][-ab]', 'a != b, char != 2'],
    ['[a][b]', '[a+b][-ab]', 'a = 2b'],
    ['[a]', '2[b]', 'a = b^2'],
    ['[a][b]', '[b][a]', 'char = 3'],
    ['[a][b]', '[b][a]', 'char = 2'],
    ['<a> + <b>', '<a+b> + <ab>', 'char = 5'],
    ['<a> + <b>', '<a+b> + <ab>', 'char = 2'],
    ['[a+b]', '[a] + [b]', 'c = a+b, char = 7'],
    ['[a][1+a]', '0', 'char = 11'],
    ['[c]', '[a] + [b]', 'c = ab'],
  ])('%s = %s ; %s', (left, right, texts) => {
    const conditions = texts.split(', ').map((text) => readCondition(text));
    const { evidence } = refuted(left, right, conditions);
    const { field, values = [] } = evidence.counterexample ?? {};
    if (field === undefined) throw new Error('no counterexample');
    const at = new Map(values.map(({ letter, value }) => [letter, value] as const));
    for (const condition of conditions)
      if (condition.kind === 'characteristic') {
        const p = condition.prime.toString();
        if (field.name !== 'any') expect(/^F_[0-9]+/.test(field.name) && isPowerOf(field.name, p)).toBe(condition.is);
      } else {
        const [l, r] = [condition.left, condition.right].map((entry) => ({
          kind: 'symbol' as const,
          entries: [entry],
        }));
        if (condition.kind === 'equal' && l && r)
          expectVerdict('equal', field.name, substitute(l, at), substitute(r, at));
      }
  });
});

const isPowerOf = (name: string, p: string): boolean => {
  let q = BigInt(/^F_([0-9]+)/.exec(name)?.[1] ?? '0');
  while (q > 1n && q % BigInt(p) === 0n) q /= BigInt(p);
  return q === 1n;
};

describe('random false statements', () => {
  it('are never proved, and their counterexamples hold', () => {
    const unit = sumUnit(['a', 'b', 'c']);
    const tiny = word(unit, { terms: 1, factors: 2, nested: false });
    const verdicts = { equal: 0, different: 0, undecided: 0 };
    // [d] is independent of all words in a, b, c, so a word is not changed by it only where it is zero itself
    fc.assert(
      fc.property(tiny, unit, (u, a) => {
        const left = expressionText(u);
        const right = `${left} + [d](${expressionText({ kind: 'angle', entries: [a] })})`;
        const found = whereDefined(() => judge('any', left, right).verdict);
        fc.pre(found !== undefined);
        if (found === undefined) return;
        verdicts[found] += 1;
        expect(found).not.toBe('equal');
        if (found === 'different') refuted(left, right);
      }),
      { numRuns: 40 },
    );
    expect(verdicts.different).toBeGreaterThan(30);
  });
});
