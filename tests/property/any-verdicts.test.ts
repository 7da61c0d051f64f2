import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { integer as coefficient, product, sum } from '@/engine/expression/expression';
import type { Element } from '@/engine/expression/element';
import { elementText } from '@/engine/expression/to-text';
import { readExpression } from '@/grammar/read';
import { decideRational } from '../oracle/pull-back';
import { identitiesInLetters, theorems, type Claim } from './any-statements';
import { smallValues, sumUnit } from './any-sums';
import { expectVerdict, judge, whereDefined } from './kmw-engine';
import { fits, identities, integers, relations, sideOf } from './kmw-identities';
import { fieldRow } from './kmw-fields';
import { difference, substitute, word } from './kmw-words';

const rows = (claims: readonly Claim[]): readonly (readonly [string, Claim])[] =>
  claims.map((claim) => [claim.name, claim] as const);
const TINY = { terms: 1, factors: 2, nested: false };

describe('what holds over every field', () => {
  it.each(rows([...theorems, ...identitiesInLetters]))('%s', (_, { left, right }) => {
    expectVerdict('equal', 'any', left, right);
    // times words in letters of its own, and with a word beside it
    expectVerdict('equal', 'any', `[u](${left})<v> + [w]`, `[w] + [u](${right})<v>`);
  });

  it.each(rows(theorems))('%s is proved by Steinberg relations, or by residues', (_, { left, right }) => {
    const { evidence } = judge('any', left, right);
    expect([evidence.kind, evidence.modEta, evidence.modH]).toEqual(['invariants', true, true]);
    // every relation that is named is one: left + right = 1
    for (const { left: x, right: y } of evidence.relations ?? [])
      expectVerdict('equal', 'any', `[${elementText(x)}]`, `[1-(${elementText(y)})]`);
  });

  it.each([2, 3, 5, 7])('and in characteristic %i', (p) => {
    for (const { left, right } of theorems) {
      const conditions = [{ kind: 'characteristic', is: true, prime: BigInt(p) }] as const;
      whereDefined(() => expectVerdict('equal', 'any', left, right, conditions));
    }
  });
});

describe('a theorem about letters', () => {
  const value = fc.constantFrom('2', '-1', '3', '1/2', 'x_1', "y'", '-z', 'x_1^2', '2z', 'x_1+z', '1-z', "x_1/y'");

  it.each(rows(theorems))('%s, holds with other units for its letters', (_, { left, right }) => {
    fc.assert(
      fc.property(fc.array(value, { minLength: 6, maxLength: 6 }), (texts) => {
        const at = new Map(['a', 'b', 'c', 'x', 'y', 'k'].map((name, i) => [name, entry(texts[i] ?? '2')] as const));
        const [l, r] = [left, right].map((side) => substitute(readExpression(side), at));
        const found = whereDefined(() => l && r && judge('any', l, r).verdict);
        fc.pre(found !== undefined);
        expect(found).not.toBe('different');
      }),
      { numRuns: 8 },
    );
  });
});

/** An entry that is typed. */
function entry(text: string): Element {
  const read = readExpression(`[${text}]`);
  const found = read.kind === 'symbol' ? read.entries[0] : undefined;
  if (found === undefined) throw new Error('no entry');
  return found;
}

describe('random words with sums for entries', () => {
  const letters = ['a', 'b'];
  const unit = sumUnit(letters);
  const row = { ...fieldRow('any'), sums: true, steinberg: true };
  const names = [...relations, ...identities].filter((identity) => fits(identity, row));
  const at = fc.tuple(unit, unit, unit).map(
    ([a, b, c]) =>
      new Map([
        ['a', a],
        ['b', b],
        ['c', c],
      ]),
  );

  it('are equal where an identity was used inside', () => {
    const verdicts = { equal: 0, different: 0, undecided: 0 };
    const instance = fc.record({
      identity: fc.constantFrom(...names),
      numbers: integers.map(({ n, m }) => ({ n: n % 4, m: m % 3 })),
      values: at,
      words: fc.tuple(word(unit, TINY), word(unit, TINY), word(unit, TINY)),
    });
    fc.assert(
      fc.property(instance, ({ identity, numbers, values, words: [u, v, w] }) => {
        const [left, right] = [identity.left, identity.right].map((side) => substitute(sideOf(side, numbers), values));
        if (left === undefined || right === undefined) return;
        const found = whereDefined(() => {
          const outcome = judge('any', sum([product([u, left, v]), w]), sum([w, product([u, right, v])]));
          return outcome.verdict;
        });
        fc.pre(found !== undefined);
        if (found !== undefined) verdicts[found] += 1;
        expect(found).not.toBe('different');
      }),
      { numRuns: 60 },
    );
    expect(verdicts.equal).toBeGreaterThan(20 * (verdicts.undecided + 1));
  });

  it.each([2n, 3n, 5n])('nor are they different in characteristic %s', (prime) => {
    const conditions = [{ kind: 'characteristic', is: true, prime }] as const;
    const verdicts = { equal: 0, different: 0, undecided: 0 };
    const small = word(unit, TINY);
    fc.assert(
      fc.property(fc.constantFrom(...names), at, small, small, (identity, values, u, w) => {
        const numbers = { n: 3, m: -2 };
        const [left, right] = [identity.left, identity.right].map((side) => substitute(sideOf(side, numbers), values));
        if (left === undefined || right === undefined) return;
        const found = whereDefined(
          () => judge('any', sum([product([u, left]), w]), sum([w, product([u, right])]), conditions).verdict,
        );
        fc.pre(found !== undefined);
        if (found !== undefined) verdicts[found] += 1;
        expect(found).not.toBe('different');
      }),
      { numRuns: 30 },
    );
    expect(verdicts.equal).toBeGreaterThan(9 * verdicts.undecided);
  });

  it('are never equal where values separate them, nor alike modulo η or h', () => {
    const verdicts = { equal: 0, different: 0, undecided: 0 };
    const small = word(unit, TINY);
    const instance = fc.record({
      u: small,
      v: small,
      c: fc.integer({ min: 1, max: 3 }),
      places: fc.array(smallValues(letters), { minLength: 6, maxLength: 6 }),
    });
    fc.assert(
      fc.property(instance, ({ u, v, c, places }) => {
        const right = sum([u, product([coefficient(BigInt(c)), difference(v, u)])]);
        const outcome = whereDefined(() => judge('any', u, right));
        fc.pre(outcome !== undefined);
        if (outcome === undefined) return;
        verdicts[outcome.verdict] += 1;
        for (const values of places) {
          const slow = defined(() => decideRational('Q', substitute(u, values), substitute(right, values)));
          if (slow === undefined) continue;
          if (outcome.verdict === 'equal') expect(slow.equal).toBe(true);
          if (outcome.evidence.modEta === true) expect(slow.modEta).toBe(true);
          if (outcome.evidence.modH === true) expect(slow.modH).toBe(true);
        }
      }),
      { numRuns: 50 },
    );
    expect(verdicts.different).toBeGreaterThan(20);
    expect(verdicts.undecided).toBeLessThan(4);
  });
});

/** A question to the slow road at values at which an entry may vanish. */
function defined<T>(question: () => T): T | undefined {
  try {
    return question();
  } catch (error) {
    if (error instanceof RangeError || (error instanceof Error && /zero/.test(error.message))) return undefined;
    throw error;
  }
}
