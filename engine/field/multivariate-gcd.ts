import {
  addMulti,
  coefficientsIn,
  constantPolynomial,
  degreeIn,
  isConstant,
  leadingIn,
  letterPower,
  lettersIn,
  multiplyMulti,
  negateMulti,
  type LetterRing,
  type MultiPolynomial,
} from './multivariate';
import { exactQuotient, normalized } from './multivariate-division';
import { coprimeByImage } from './multivariate-image';

/**
 * The greatest common divisor of two polynomials, not both zero, as rational functions see it: constants do not count, and it is
 * normalized (see `normalized`).
 *
 * By recursion on the letters: contents and primitive parts in one letter, and the primitive remainder sequence of these
 * (H. Cohen, A Course in Computational Algebraic Number Theory, Algorithm 3.2.10, number from memory). Most pairs have nothing
 * in common, and that is seen at an image in one letter over a prime field before anything else is tried.
 */
export function gcdMulti(ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial): MultiPolynomial {
  if (f.length === 0) return normalized(ring, g).primitive;
  if (g.length === 0) return normalized(ring, f).primitive;
  return gcdOfPrimitive(ring, normalized(ring, f).primitive, normalized(ring, g).primitive);
}

function gcdOfPrimitive(ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial): MultiPolynomial {
  ring.budget.spend('looking for common factors of polynomials');
  if (isConstant(f) || isConstant(g)) return constantPolynomial(ring, 1n);
  const [ofF, ofG] = [lettersIn(ring, f), lettersIn(ring, g)];
  const alone = (own: readonly number[], other: readonly number[]): number | undefined =>
    own.find((letter) => !other.includes(letter));
  const [onlyF, onlyG] = [alone(ofF, ofG), alone(ofG, ofF)];
  if (onlyF !== undefined) return gcdWithContent(ring, f, onlyF, g);
  if (onlyG !== undefined) return gcdWithContent(ring, g, onlyG, f);

  const height = (letter: number): number => Math.max(degreeIn(f, letter), degreeIn(g, letter));
  const letter = ofF.reduce((best, next) => (height(next) < height(best) ? next : best));
  const [contentF, contentG] = [contentIn(ring, f, letter), contentIn(ring, g, letter)];
  const content = gcdOfPrimitive(ring, contentF, contentG);
  const [a, b] = [quotient(ring, f, contentF), quotient(ring, g, contentG)];
  if (coprimeByImage(ring, a, b, letter)) return content;
  return normalized(ring, multiplyMulti(ring, content, gcdInLetter(ring, a, b, letter))).primitive;
}

/** gcd(content of f in a letter, g), for a g without this letter. */
function gcdWithContent(ring: LetterRing, f: MultiPolynomial, letter: number, g: MultiPolynomial): MultiPolynomial {
  let common = g;
  for (const coefficient of coefficientsIn(f, letter).values()) {
    if (isConstant(common)) break;
    common = gcdOfPrimitive(ring, normalized(ring, coefficient).primitive, common);
  }
  return common;
}

/** The content of f as a polynomial in one letter, normalized; constants do not count. */
export function contentIn(ring: LetterRing, f: MultiPolynomial, letter: number): MultiPolynomial {
  let content: MultiPolynomial = [];
  // short coefficients first: they settle it soonest
  for (const coefficient of [...coefficientsIn(f, letter).values()].sort((a, b) => a.length - b.length)) {
    content = gcdMulti(ring, coefficient, content);
    if (isConstant(content)) break;
  }
  return content;
}

const quotient = (ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial): MultiPolynomial => {
  if (isConstant(g)) return f;
  const found = exactQuotient(ring, f, g);
  if (found === undefined) throw new Error('a content does not divide');
  return found;
};

/** The gcd of polynomials that are primitive in the letter. */
function gcdInLetter(ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial, letter: number): MultiPolynomial {
  let [a, b] = degreeIn(f, letter) >= degreeIn(g, letter) ? [f, g] : [g, f];
  for (;;) {
    const rest = exactQuotient(ring, a, b) === undefined ? pseudoRemainder(ring, a, b, letter) : [];
    if (rest.length === 0) return b;
    if (degreeIn(rest, letter) === 0) return constantPolynomial(ring, 1n);
    const primitive = normalized(ring, rest).primitive;
    [a, b] = [b, quotient(ring, primitive, contentIn(ring, primitive, letter))];
  }
}

/** A multiple of f by a power of the leading coefficient of g, less a multiple of g, of lower degree in the letter than g. */
function pseudoRemainder(ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial, letter: number): MultiPolynomial {
  const degree = degreeIn(g, letter);
  const lead = leadingIn(g, letter);
  let rest = f;
  for (let top = degreeIn(rest, letter); top >= degree && rest.length > 0; top = degreeIn(rest, letter)) {
    const head = multiplyMulti(ring, leadingIn(rest, letter), letterPower(ring, letter, top - degree));
    rest = addMulti(ring, multiplyMulti(ring, lead, rest), negateMulti(ring, multiplyMulti(ring, head, g)));
  }
  return rest;
}
