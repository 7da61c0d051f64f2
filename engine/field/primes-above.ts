import type { Budget } from '../arith/budget';
import { echelonModulo, relationsModulo } from '../arith/linear-modulo';
import { inverseModulo, modulo } from '../arith/modular';
import { factorOverFinite } from './factor-finite';
import type { IntegerPolynomial } from './integer-polynomial';
import { highFrobenius, maximalOrderAt } from './maximal-order';
import { powerOrder, type Coordinates, type Order } from './order';
import {
  dividePolynomials,
  gcdPolynomials,
  invertPolynomial,
  multiplyPolynomials,
  remainderPolynomial,
  trimmed,
  type Polynomial,
} from './polynomial';
import { primeField } from './prime-field';
import { PrimeIdeal } from './prime-ideal';

/** The prime ideals above a prime p of the field ℚ[x]/(modulus), the modulus irreducible and monic over ℤ, in a fixed order. */
export function primesAbove(modulus: IntegerPolynomial, p: bigint, budget: Budget): readonly PrimeIdeal[] {
  const doing = `splitting ${p} in a number field`;
  const spend = (): void => budget.spend(doing);
  return (
    dedekindPrimes(modulus, p, budget, doing, spend) ?? algebraPrimes(maximalOrderAt(modulus, p, spend), p, budget)
  );
}

/**
 * The primes (p, g) for the irreducible factors g of the modulus, when ℤ[x] is maximal at p; `undefined` when it is not: R. Dedekind's theorem
 * and criterion, Cohen, Theorems 4.8.13 and 6.1.4 (numbers from memory).
 */
function dedekindPrimes(
  modulus: IntegerPolynomial,
  p: bigint,
  budget: Budget,
  doing: string,
  spend: () => void,
): readonly PrimeIdeal[] | undefined {
  const field = primeField(p);
  type P = Polynomial<bigint>;
  const image = modulus.map((c) => modulo(c, p));
  const { factors } = factorOverFinite(field, image, budget, doing);
  const product = (list: readonly P[]): P => list.reduce((f, g) => multiplyPolynomials(field, f, g), [1n]);
  if (factors.some(({ exponent }) => exponent > 1)) {
    const radical = product(factors.map(({ factor }) => factor));
    const cofactor = dividePolynomials(field, image, radical).quotient;
    const lifted = new Array<bigint>(modulus.length).fill(0n);
    radical.forEach((a, i) => cofactor.forEach((b, j) => void (lifted[i + j]! += a * b)));
    const defect = trimmed(
      field,
      lifted.map((c, i) => modulo((c - modulus[i]!) / p, p)),
    );
    const common = gcdPolynomials(field, gcdPolynomials(field, radical, cofactor), defect);
    if (common.length !== 1) return undefined;
  }
  const order = powerOrder(modulus, spend);
  const coordinates = (f: P): Coordinates => Array.from({ length: order.degree }, (_, i) => f[i] ?? 0n);
  return factors.map(({ factor, exponent }) => {
    const part = product(Array.from({ length: exponent }, () => factor));
    const others = dividePolynomials(field, image, part).quotient;
    const inverse = invertPolynomial(field, remainderPolynomial(field, others, part), part)!;
    return new PrimeIdeal({
      order,
      p,
      ramification: exponent,
      residueDegree: factor.length - 1,
      inverse: coordinates(dividePolynomials(field, image, factor).quotient),
      idempotent: coordinates(remainderPolynomial(field, multiplyPolynomials(field, others, inverse), image)),
      generator: factor,
    });
  });
}

/**
 * The primes above p from an order 𝒪 that is maximal at p: the primitive idempotents of the fixed elements of x ↦ x^p in 𝒪/p𝒪, found one
 * by one through minimal polynomials, and for each what its radical annihilates. J. Buchmann, H. W. Lenstra in Cohen, section 6.2 (from memory).
 */
function algebraPrimes(order: Order, p: bigint, budget: Budget): readonly PrimeIdeal[] {
  const n = order.degree;
  const { spend } = order;
  const unit = (i: number): bigint[] => Array.from({ length: n }, (_, j) => (i === j ? 1n : 0n));
  const high = highFrobenius(order, p);
  const moved = Array.from({ length: n }, (_, i) => order.power(unit(i), p, p).map((c, j) => (i === j ? c - 1n : c)));
  const fixed = relationsModulo(moved, p, spend).vectors;
  const radical = relationsModulo(high, p, spend).vectors;
  const idempotents = split(order, p, fixed, budget);
  return idempotents.map((idempotent) => {
    const own = echelonModulo(
      Array.from({ length: n }, (_, i) => order.multiply(unit(i), idempotent, p)),
      p,
      spend,
    ).vectors;
    const ownRadical = echelonModulo(
      radical.map((r) => order.multiply(r, idempotent, p)),
      p,
      spend,
    ).vectors;
    // the elements of 𝒪·idempotent that its radical annihilates; all of them when there is none
    const products = own.map((a) => ownRadical.flatMap((r) => order.multiply(a, r, p)));
    const annihilating = ownRadical.length === 0 ? [unit(0)] : relationsModulo(products, p, spend).vectors;
    const inverse = own.reduce<bigint[]>(
      (sum, a, i) => sum.map((c, j) => modulo(c + annihilating[0]![i]! * a[j]!, p)),
      new Array<bigint>(n).fill(0n),
    );
    const residueDegree = own.length - ownRadical.length;
    return new PrimeIdeal({
      order,
      p,
      ramification: own.length / residueDegree,
      residueDegree,
      inverse,
      idempotent,
      generator: undefined,
    });
  });
}

/** The primitive idempotents of the algebra 𝔽_p^g of fixed elements, given by a basis. */
function split(order: Order, p: bigint, fixed: readonly Coordinates[], budget: Budget): readonly Coordinates[] {
  const field = primeField(p);
  let idempotents: readonly Coordinates[] = [order.coordinates([1n])];
  for (const b of fixed) {
    if (idempotents.length === fixed.length) break;
    idempotents = idempotents.flatMap((e) => {
      const element = order.multiply(b, e, p);
      // the powers of the element up to the first that depends on those before it
      const powers: Coordinates[] = [e];
      for (;;) {
        const [relation] = relationsModulo(powers, p, order.spend).vectors;
        if (relation !== undefined) {
          const minimal = trimmed(field, [...relation]);
          const roots = factorOverFinite(field, minimal, budget).factors.map(({ factor }) => field.negate(factor[0]!));
          return roots.map((root) => lagrange(order, p, e, element, root, roots));
        }
        powers.push(order.multiply(powers[powers.length - 1]!, element, p));
      }
    });
  }
  return idempotents;
}

/** The product of (element − s·e)/(root − s) over the other roots s. */
function lagrange(
  order: Order,
  p: bigint,
  e: Coordinates,
  element: Coordinates,
  root: bigint,
  roots: readonly bigint[],
): Coordinates {
  return roots.reduce<Coordinates>((product, s) => {
    if (s === root) return product;
    const scale = inverseModulo(root - s, p);
    const factor = element.map((c, i) => modulo((c - s * e[i]!) * scale, p));
    return order.multiply(product, factor, p);
  }, e);
}
