import type { Budget } from '../arith/budget';
import { integerElement } from '../expression/element';
import { exponentMap } from '../place/rational-entry';
import { see } from '../place/sight';
import type { Visited } from '../place/theta-ring';
import { mappedRing } from '../ring/mapped-ring';
import { residueRing } from '../ring/residue-ring';
import { wordRing, type Monomial, type Words } from '../ring/word-ring';
import { isZero, minusOneElement } from '../ring/write-word';
import { spelled, writeWords } from './number-writing';
import type { NormalizedDegree } from './outcome';
import type { RationalClasses } from './rational-classes';
import { rationalNormalForm } from './rational-normal-form';

/** With larger numbers in it a class is not brought into canonical form, which would take numbers of their size apart. */
const LARGE = 1n << 128n;

/**
 * A side of what is compared over ℚ as it is shown: its canonical form, or, where large numbers are in it, canonical words in a coprime base of
 * its entries, which are the same element and need not be the shortest.
 */
export function writtenOverRationals<A, B extends Visited>(
  classes: RationalClasses<A, B>,
  side: number,
  budget: Budget,
): readonly NormalizedDegree[] {
  const base = see(classes.entries, 'none', budget);
  if (base.every(({ value }) => value < LARGE)) return rationalNormalForm(classes, side, budget);
  const monomial = (unit: B): Monomial => {
    const entry = classes.rational(unit);
    return {
      negative: entry.negative,
      exponents: new Map([...exponentMap(entry)].map(([i, e]) => [i, BigInt(e)])),
    };
  };
  const ring = mappedRing(wordRing('zero', budget), monomial);
  const image = classes.image(classes.sides[side] ?? [], residueRing<B, Words>(ring, classes.minusOne), budget);
  const generators = [minusOneElement, ...base.map(({ value }) => integerElement(value))];
  return [...image]
    .sort(([a], [b]) => b - a)
    .map(([degree, words]) => ({
      degree,
      normalForm: writeWords(spelled(words, degree, generators), (a) => a),
      canonical: false,
    }))
    .filter(({ normalForm }) => !isZero(normalForm));
}
