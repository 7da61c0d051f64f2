import type { Budget } from '../arith/budget';
import { distinctDegrees } from './distinct-degree';
import { equalDegreeFactors } from './equal-degree';
import { divisorBound } from './factor-bounds';
import type { PolynomialFactors } from './factor-finite';
import { liftFactors } from './hensel';
import {
  compareIntegerPolynomials,
  monicRational,
  multiplyIntegers,
  primitiveOfRational,
  type IntegerPolynomial,
} from './integer-polynomial';
import { residuesModulo, squareFreeIntegers } from './modular-gcd';
import type { Polynomial } from './polynomial';
import type { Rational } from './rational';
import { recombine } from './recombine';
import { SmallPrimePolynomials } from './small-prime-polynomials';
import type { Power } from './square-free';
import { trialPrimes } from './word-primes';

/** Good primes looked at before one is chosen, when none of them has few factors. */
const TRIALS = 7;

/**
 * The factorisation over ℚ of f ≠ 0, the factors monic, ordered by degree and then by the coefficients from the top of their
 * primitive multiples over ℤ. It is multiplied back before it is given. Throws a RangeError for 0.
 */
export function factorOverRationals(
  f: Polynomial<Rational>,
  budget: Budget,
  doing = `factoring a polynomial of degree ${f.length - 1} over Q`,
): PolynomialFactors<Rational> {
  if (f.length === 0) throw new RangeError('0 has no factorisation');
  const factors = factorPrimitive(primitiveOfRational(f).primitive, budget, doing);
  return {
    unit: f[f.length - 1]!,
    factors: factors.map(({ factor, exponent }) => ({ factor: monicRational(factor), exponent })),
  };
}

/**
 * The irreducible primitive factors over ℤ, leading coefficients positive, of a primitive f with positive leading coefficient, in the
 * order of `compareIntegerPolynomials`; multiplied back before they are given.
 */
export function factorPrimitive(
  f: IntegerPolynomial,
  budget: Budget,
  doing = `factoring a polynomial of degree ${f.length - 1} over Q`,
): readonly Power<IntegerPolynomial>[] {
  const spend = (): void => budget.spend(doing);
  spend();
  // a power of the variable is taken off by looking at it
  const shift = f.findIndex((c) => c !== 0n);
  const rest = shift > 0 ? f.slice(shift) : f;
  const factors = squareFreeIntegers(rest, spend).flatMap(({ factor, exponent }) =>
    factorSquareFree(factor, spend).map((irreducible) => ({ factor: irreducible, exponent })),
  );
  const product = factors.reduce(
    (value, { factor, exponent }) => {
      let power = value;
      for (let i = 0; i < exponent; i++) {
        spend();
        power = multiplyIntegers(power, factor);
      }
      return power;
    },
    [1n] as IntegerPolynomial,
  );
  if (compareIntegerPolynomials(product, rest) !== 0) throw new Error('the factors found do not multiply back');
  const all = shift > 0 ? [{ factor: [0n, 1n], exponent: shift }, ...factors] : factors;
  return [...all].sort((a, b) => compareIntegerPolynomials(a.factor, b.factor));
}

/** A prime modulo which f keeps its degree and stays square-free, with the factors by degree. */
interface Modular {
  readonly p: number;
  readonly count: number;
  readonly factors: () => readonly (readonly number[])[];
}

/** The irreducible factors over ℤ of a primitive square-free f of degree ≥ 1 with positive leading coefficient. */
function factorSquareFree(f: IntegerPolynomial, spend: () => void): readonly IntegerPolynomial[] {
  const n = f.length - 1;
  if (n === 1) return [f];
  let degrees = (1n << BigInt(n + 1)) - 1n;
  let best: Modular | undefined;
  let looked = 0;
  for (const p of trialPrimes()) {
    if (looked >= TRIALS || (best !== undefined && best.count <= 3 && looked >= 3)) break;
    const found = modularFactors(f, p, spend);
    if (found === undefined) continue;
    looked++;
    degrees &= found.degrees;
    // only the whole of f can be a divisor
    if (found.count === 1 || degrees === (1n | (1n << BigInt(n)))) return [f];
    if (best === undefined || found.count < best.count) best = found;
  }
  const { p, factors } = best!;
  const bound = 2n * divisorBound(f, (n - (n & 1)) / 2);
  let k = 1;
  for (let power = BigInt(p); power <= bound; power *= BigInt(p)) k++;
  const modular = factors().map((g) => g.map(BigInt));
  return recombine(f, liftFactors(f, modular, BigInt(p), k, spend), BigInt(p) ** BigInt(k), degrees, spend);
}

function modularFactors(
  f: IntegerPolynomial,
  p: number,
  spend: () => void,
): (Modular & { readonly degrees: bigint }) | undefined {
  if (f[f.length - 1]! % BigInt(p) === 0n) return undefined;
  const ring = new SmallPrimePolynomials(p, spend);
  const image = ring.monic(residuesModulo(f, p));
  if (ring.degree(ring.gcd(image, ring.derivative(image))) !== 0) return undefined;
  const parts = [...distinctDegrees(ring, image)];
  let count = 0;
  let degrees = 1n;
  for (const { product, degree } of parts) {
    for (let left = ring.degree(product); left > 0; left -= degree) {
      count++;
      degrees |= degrees << BigInt(degree);
    }
  }
  return { p, count, degrees, factors: () => parts.flatMap((part) => equalDegreeFactors(ring, part, spend)) };
}
