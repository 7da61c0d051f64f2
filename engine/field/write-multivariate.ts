import {
  integerElement,
  letterElement,
  negateElement,
  powerElement,
  productElement,
  sumElement,
  type Element,
} from '../expression/element';
import type { LetterRing, MultiPolynomial, MultiTerm } from './multivariate';

/**
 * A polynomial in letters as it is written: with a constant term by rising degree, `1-a`, `1+a+a^2`, without one from the first
 * letter down, `a^2-a*b`. In characteristic p coefficients are the numbers of least size.
 */
export function writeMultivariate(ring: LetterRing, f: MultiPolynomial): Element {
  const constant = f.some(({ exponents }) => exponents.every((e) => e === 0));
  const degree = ({ exponents }: MultiTerm): number => exponents.reduce((sum, e) => sum + e, 0);
  const terms = constant ? [...f].sort((a, b) => degree(a) - degree(b)) : f;
  const written = terms.map((term) => writeTerm(ring, term));
  return written.length === 0
    ? integerElement(0n)
    : written.length === 1 && written[0]
      ? written[0]
      : sumElement(written);
}

function writeTerm(ring: LetterRing, { exponents, coefficient }: MultiTerm): Element {
  const c = leastSize(ring, coefficient);
  const size = c < 0n ? -c : c;
  const powers = exponents.flatMap((e, i) => {
    const letter = letterElement(ring.letters[i] ?? 'a');
    return e === 0 ? [] : [e === 1 ? letter : powerElement(letter, e)];
  });
  const factors = size === 1n && powers.length > 0 ? powers : [integerElement(size), ...powers];
  const word = factors.length === 1 && factors[0] ? factors[0] : productElement(factors);
  return c < 0n ? negateElement(word) : word;
}

/** A coefficient as a number of least size: −p/2 < c ≤ p/2 in characteristic p. */
export const leastSize = (ring: LetterRing, c: bigint): bigint =>
  ring.characteristic !== 0n && 2n * c > ring.characteristic ? c - ring.characteristic : c;

/**
 * The sign with which a normalized polynomial is written: −1 where a constant term would be negative, so that a − 1 is written
 * as −(1 − a).
 */
export function writtenSign(ring: LetterRing, f: MultiPolynomial): 1 | -1 {
  const constant = f.find(({ exponents }) => exponents.every((e) => e === 0));
  return constant !== undefined && leastSize(ring, constant.coefficient) < 0n ? -1 : 1;
}
