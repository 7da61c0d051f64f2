import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Element } from '@/engine/expression/element';
import { expressionText } from '@/engine/expression/to-text';
import { canonicalWords, primeMonomial, writeWords, type Monomial } from '../oracle/canonical-words';
import { canonicalText, expectVerdict, judge } from '../property/kmw-engine';
import { fieldRow, monomialUnit, rationalUnit } from '../property/kmw-fields';
import { pair } from '../property/kmw-statements';
import { word } from '../property/kmw-words';

/** ± a product of powers of letters. */
function letterMonomial(entry: Element): Monomial {
  const exponents = new Map<string, number>();
  let negative = false;
  const walk = (e: Element, times: number): void => {
    switch (e.kind) {
      case 'letter':
        exponents.set(e.name, (exponents.get(e.name) ?? 0) + times);
        return;
      case 'negate':
        if (times % 2 !== 0) negative = !negative;
        return walk(e.of, times);
      case 'product':
        return e.factors.forEach((factor) => walk(factor, times));
      case 'quotient':
        walk(e.numerator, times);
        return walk(e.denominator, -times);
      case 'power':
        return walk(e.base, times * e.exponent);
      case 'integer':
        if (e.value === 1n) return;
    }
    throw new RangeError(`no product of letters: ${e.kind}`);
  };
  walk(entry, 1);
  return { negative, exponents };
}

const short = { terms: 2, factors: 2, nested: false };

/** Expansion into canonical words, one rewriting at a time (F. Morel, LNM 2052, ch. 3), against homomorphisms. */
describe('canonical words in primes', () => {
  const unit = rationalUnit([2, 3, 5]);

  it('are the class they were expanded from: homomorphisms find no difference', () => {
    fc.assert(
      fc.property(word(unit, short), (u) => {
        const words = writeWords(canonicalWords(u, primeMonomial, 0n));
        expectVerdict('equal', 'Q', u, words);
      }),
      { numRuns: 60 },
    );
  });

  it('where they agree, homomorphisms agree; where these differ, so do the words', () => {
    const counts = { equalWords: 0, equal: 0, different: 0 };
    fc.assert(
      fc.property(pair({ ...fieldRow('any'), unit }), ({ left, right }) => {
        const [l, r] = [left, right].map((side) => writeWords(canonicalWords(side, primeMonomial, 0n)));
        const { verdict, evidence, parts } = judge('Q', left, right);
        expect(evidence.kind).toBe('invariants');
        expect(parts.every(({ compared }) => compared.every(({ map }) => map !== 'word'))).toBe(true);
        if (sorted(l) === sorted(r)) {
          counts.equalWords += 1;
          expect(verdict, `${expressionText(left)} = ${expressionText(right)}`).toBe('equal');
        }
        counts[verdict === 'equal' ? 'equal' : 'different'] += 1;
      }),
      { numRuns: 100 },
    );
    expect(counts.equalWords).toBeGreaterThan(20);
    expect(counts.different).toBeGreaterThan(5);
  });
});

const sorted = (text: string | undefined): string =>
  (text ?? '')
    .split(/ (?=[+-] )/)
    .sort()
    .join(' ');

describe.each([0, 2, 3, 5, 7])('canonical words in letters, characteristic %i', (p) => {
  const conditions = p === 0 ? [] : [{ kind: 'characteristic', is: true, prime: BigInt(p) } as const];
  const row = { ...fieldRow('any'), unit: monomialUnit(['a', 'b', 'c']) };

  it('agree iff the engine says equal, and its canonical forms are the same texts then', () => {
    const counts = { equal: 0, different: 0, undecided: 0 };
    fc.assert(
      fc.property(pair(row), ({ left, right }) => {
        const [l, r] = [left, right].map((side) => sorted(writeWords(canonicalWords(side, letterMonomial, BigInt(p)))));
        const { verdict } = judge('any', left, right, conditions);
        expect(verdict, `${expressionText(left)} = ${expressionText(right)}`).toBe(l === r ? 'equal' : 'different');
        const [x, y] = [left, right].map((side) => canonicalText('any', side, conditions));
        expect(x === y).toBe(verdict === 'equal');
        counts[verdict] += 1;
      }),
      { numRuns: 80 },
    );
    expect(counts.undecided).toBe(0);
    expect(counts.equal).toBeGreaterThan(20);
    expect(counts.different).toBeGreaterThan(4);
  });
});
