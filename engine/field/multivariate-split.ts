import { derivativeIn, degreeIn, isConstant, lettersIn, type LetterRing, type MultiPolynomial } from './multivariate';
import { coprimeBaseMulti } from './multivariate-base';
import { exactQuotient } from './multivariate-division';
import { contentIn, gcdMulti } from './multivariate-gcd';

/**
 * A finer coprime base: every member is primitive in each of its letters and, where that can be told by derivatives, without a
 * repeated factor; so a member of degree 1 in some letter is irreducible.
 */
export function splitBase(ring: LetterRing, polynomials: Iterable<MultiPolynomial>): readonly MultiPolynomial[] {
  return coprimeBaseMulti(ring, polynomials).flatMap((f) => split(ring, f));
}

function split(ring: LetterRing, f: MultiPolynomial): readonly MultiPolynomial[] {
  const letters = lettersIn(ring, f);
  for (const letter of letters) {
    const content = contentIn(ring, f, letter);
    if (!isConstant(content)) return parted(ring, f, content);
  }
  if (letters.some((letter) => degreeIn(f, letter) === 1)) return [f];
  for (const letter of letters) {
    const derivative = derivativeIn(ring, f, letter);
    if (derivative.length === 0) continue;
    const repeated = gcdMulti(ring, f, derivative);
    if (!isConstant(repeated)) return parted(ring, f, repeated);
    break;
  }
  return [f];
}

/** f split along a divisor. */
function parted(ring: LetterRing, f: MultiPolynomial, divisor: MultiPolynomial): readonly MultiPolynomial[] {
  const rest = exactQuotient(ring, f, divisor);
  if (rest === undefined) throw new Error('a divisor does not divide');
  return coprimeBaseMulti(ring, [divisor, rest]).flatMap((part) => split(ring, part));
}
