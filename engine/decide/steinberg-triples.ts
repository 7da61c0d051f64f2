import { valuation } from '../arith/valuation';
import {
  constantPolynomial,
  isConstant,
  multiplyMulti,
  powerMulti,
  scaleMulti,
  type LetterRing,
  type MultiPolynomial,
} from '../field/multivariate';
import { multiplicity } from '../field/multivariate-division';
import { leastSize } from '../field/write-multivariate';
import type { Monomial } from '../ring/word-ring';
import type { Generator } from './letters-generators';

/** A product of generators by their exponents, none negative. */
export type Product = readonly number[];

export interface SignedProduct {
  readonly negative: boolean;
  readonly product: Product;
}

/** Three signed products, pairwise coprime, whose sum is zero. */
export type Triple = readonly [SignedProduct, SignedProduct, SignedProduct];

/** x + y = 1 for two ± monomials in generators, so that [x][y] = 0. `weight` counts the generators in it, with repetitions. */
export interface SteinbergPair {
  readonly x: Monomial;
  readonly y: Monomial;
  readonly weight: number;
}

export const weightOf = (product: Product): number => product.reduce((sum, e) => sum + e, 0);

export const isCoprime = (a: Product, b: Product): boolean => a.every((e, i) => e === 0 || b[i] === 0);

/** A name for a triple, whatever the order and the signs: coprime products have one sum of zero at most. */
export const nameOfTriple = (products: readonly Product[]): string =>
  products
    .map((product) => product.join())
    .sort()
    .join(';');

/** The product multiplied out. */
export function polynomialOf(
  ring: LetterRing,
  generators: readonly Generator[],
  { negative, product }: SignedProduct,
): MultiPolynomial {
  const size = product.reduce(
    (result, e, i) => {
      const g = generators[i];
      if (e === 0 || g === undefined) return result;
      const value = g.kind === 'integer' ? constantPolynomial(ring, g.value) : g.value;
      return multiplyMulti(ring, result, powerMulti(ring, value, e));
    },
    constantPolynomial(ring, 1n),
  );
  return negative ? scaleMulti(ring, -1n, size) : size;
}

/** A polynomial, not zero, as ± a product of generators; `undefined` where it is none. */
export function productOf(
  ring: LetterRing,
  generators: readonly Generator[],
  f: MultiPolynomial,
): SignedProduct | undefined {
  let rest = f;
  const exponents = generators.map((generator) => {
    if (generator.kind === 'integer' || isConstant(rest)) return 0;
    const found = multiplicity(ring, rest, generator.value);
    rest = found.rest;
    return found.exponent;
  });
  if (!isConstant(rest)) return undefined;
  let constant = leastSize(ring, rest[0]?.coefficient ?? 0n);
  const product = generators.map((generator, i) => {
    if (generator.kind !== 'integer' || constant === 0n) return exponents[i] ?? 0;
    const { exponent, unit } = valuation(constant, generator.value);
    constant = unit;
    return exponent;
  });
  return constant === 1n || constant === -1n ? { negative: constant < 0n, product } : undefined;
}

/**
 * A pair for a triple: over 1 where it is among the products, else over the one with the last generator. The other two pairs
 * follow from it, by [1/x] = −⟨x⟩[x] and [x][−x] = 0.
 */
export function pairOf(triple: Triple): SteinbergPair {
  const rank = ({ product }: SignedProduct): number =>
    weightOf(product) === 0 ? Infinity : product.findLastIndex((e) => e > 0);
  const [below, first, second] = [...triple].sort((a, b) => rank(b) - rank(a)) as [...Triple];
  const weight = triple.reduce((sum, { product }) => sum + weightOf(product), 0);
  return { x: quotient(first, below), y: quotient(second, below), weight };
}

/** −above/below. */
function quotient(above: SignedProduct, below: SignedProduct): Monomial {
  const exponents = new Map<number, bigint>();
  above.product.forEach((e, i) => {
    const difference = e - (below.product[i] ?? 0);
    if (difference !== 0) exponents.set(i, BigInt(difference));
  });
  return { negative: above.negative === below.negative, exponents };
}
