import type { Budget } from '../arith/budget';
import { integerElement } from '../expression/element';
import type { Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import { rationals } from '../field/rational';
import { exponentMap } from '../place/rational-entry';
import { see } from '../place/sight';
import type { Visited } from '../place/theta-ring';
import { expressionRing } from '../ring/expression-ring';
import type { Graded, GradedRing } from '../ring/graded-ring';
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
 * its entries, which are the same element and need not be the shortest; and the
 * words as they stand where these are too many.
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
  const generators = [minusOneElement, ...base.map(({ value }) => integerElement(value))];
  const write = (words: Words, degree: number): Expression => writeWords(spelled(words, degree, generators), (a) => a);
  const terms = classes.sides[side] ?? [];
  const image = <H>(ring: GradedRing<B, H>): Graded<H> =>
    classes.image(terms, residueRing<B, H>(ring, classes.minusOne), budget);
  try {
    return parts(image(mappedRing(wordRing('zero', budget), monomial)), write);
  } catch (error) {
    if (!(error instanceof Refusal) || error.code !== 'size') throw error;
  }
  const asItStands = expressionRing<B>((unit) => rationals.write(classes.rational(unit).value));
  return parts(image(asItStands), ({ expression }) => expression);
}

const parts = <H>(image: Graded<H>, write: (value: H, degree: number) => Expression): readonly NormalizedDegree[] =>
  [...image]
    .sort(([a], [b]) => b - a)
    .map(([degree, value]) => ({ degree, normalForm: write(value, degree), canonical: false }))
    .filter(({ normalForm }) => !isZero(normalForm));
