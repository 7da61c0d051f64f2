import type { Budget } from '../arith/budget';
import { jacobi } from '../arith/jacobi';
import { exactSquareRoot } from '../arith/roots';
import { distinctDegrees } from './distinct-degree';
import { equalDegreeFactors } from './equal-degree';
import { factorPrimitive } from './factor-rational';
import { derivativeInteger, primitivePart, type IntegerPolynomial } from './integer-polynomial';
import { characteristicPolynomial, multiplyModuloMonic, normOf } from './integer-residues';
import { gcdIntegers, residuesModulo } from './modular-gcd';
import type { NumberField, NumberFieldElement } from './number-field';
import { resultant } from './polynomial';
import { primeField } from './prime-field';
import { SmallPrimePolynomials } from './small-prime-polynomials';
import { wordPrime } from './word-primes';

/** Primes at which an element is looked at before it is proved to be a square. */
const TRIALS = 20;

/**
 * Whether a ≠ 0 is a square in a number field κ of degree n.
 *
 * "No" is seen modulo a prime ideal as a rule. Otherwise let ac² generate κ over ℚ, for some c, and let χ be its minimal polynomial: a root of ac² lies in
 * κ iff its degree over ℚ is n and not 2n, that is iff χ(x²) is reducible over ℚ. Compare Cohen, section 3.6.2 on factoring over number fields by norms
 * (B. Trager 1976).
 */
export function isSquareInNumberField(field: NumberField, a: NumberFieldElement, budget: Budget): boolean {
  const doing = `deciding whether an element of ${field.name} is a square`;
  const spend = (): void => budget.spend(doing);
  spend();
  const { numerator, denominator } = field.model.integral(a);
  const { modulus } = field.model;
  // a·denominator² is integral and has the same class
  const integral = numerator.map((c) => c * denominator);
  const norm = normOf(integral, modulus, spend);
  if (norm < 0n || exactSquareRoot(norm) === undefined) return false;
  for (let place = 0, seen = 0; seen < TRIALS; place++) {
    const character = characterModulo(integral, modulus, wordPrime(place), spend);
    if (character === -1) return false;
    if (character === 1) seen++;
  }
  for (const c of generators()) {
    const square = multiplyModuloMonic(c, c, modulus);
    const chi = characteristicPolynomial(multiplyModuloMonic(integral, square, modulus), modulus, spend);
    if (gcdIntegers(chi, primitivePart(derivativeInteger(chi)), spend).length > 1) continue;
    const doubled = chi.flatMap((coefficient, i) => (i === 0 ? [coefficient] : [0n, coefficient]));
    return factorPrimitive(doubled, budget, doing).length > 1;
  }
  throw new Error('no element generates the field');
}

/** 1, x, x + 1, x − 1, x + 2, … : all but finitely many c make ac² a generator of the field. */
function* generators(): Generator<IntegerPolynomial> {
  yield [1n];
  yield [0n, 1n];
  for (let k = 1n; ; k++) {
    yield [k, 1n];
    yield [-k, 1n];
  }
}

/** The quadratic character at a prime ideal of least degree above p, 0 when it tells nothing. */
function characterModulo(a: IntegerPolynomial, modulus: IntegerPolynomial, p: number, spend: () => void): -1 | 0 | 1 {
  spend();
  const ring = new SmallPrimePolynomials(p, spend);
  const image = residuesModulo(modulus, p);
  if (ring.degree(ring.gcd(image, ring.derivative(image))) > 0) return 0;
  const { value: part } = distinctDegrees(ring, image).next();
  if (part === undefined) return 0;
  const [factor] = equalDegreeFactors(ring, part, spend);
  const residue = ring.divide(residuesModulo(a, p), factor!).remainder;
  if (ring.degree(residue) < 0) return 0;
  const field = primeField(BigInt(p));
  return jacobi(resultant(field, factor!.map(BigInt), residue.map(BigInt)), BigInt(p));
}
