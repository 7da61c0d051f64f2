import type { Budget } from '../arith/budget';
import { coprimeOverFinite, type CoprimeBase } from './coprime-finite';
import { CoprimePieces } from './coprime-pieces';
import { compareIntegerPolynomials, exactQuotient, monicRational, primitiveOfRational } from './integer-polynomial';
import type { IntegerPolynomial } from './integer-polynomial';
import { gcdIntegers, residuesModulo, squareFreeIntegers } from './modular-gcd';
import type { Polynomial } from './polynomial';
import { primeField } from './prime-field';
import type { Rational } from './rational';
import { SmallPrimePolynomials } from './small-prime-polynomials';
import { wordPrime } from './word-primes';

/** `coprimePrimitive` for polynomials ≠ 0 over ℚ; the base is monic. Throws a RangeError when the list contains 0. */
export function coprimeOverRationals(
  list: readonly Polynomial<Rational>[],
  budget: Budget,
): CoprimeBase<Polynomial<Rational>> {
  if (list.some((f) => f.length === 0)) throw new RangeError('0 has no coprime base');
  const { base, exponents } = coprimePrimitive(
    list.map((f) => primitiveOfRational(f).primitive),
    budget,
  );
  return { base: base.map(monicRational), exponents };
}

/**
 * A coprime base of primitive polynomials over ℤ: primitive square-free polynomials of degree ≥ 1 with positive leading
 * coefficients, pairwise coprime, in the order of `compareIntegerPolynomials`. Nothing is factored over ℚ, so that members may be
 * reducible.
 *
 * Two polynomials with a common divisor have one modulo every prime that divides neither leading coefficient: a coprime base modulo one
 * such prime says which pairs have to be looked at.
 */
export function coprimePrimitive(
  list: readonly IntegerPolynomial[],
  budget: Budget,
  doing = 'comparing polynomials over Q',
): CoprimeBase<IntegerPolynomial> {
  const spend = (): void => budget.spend(doing);
  const p = primeFor(list, spend);
  const ring = new SmallPrimePolynomials(p, spend);
  const images = list.map((f) => residuesModulo(f, p).map(BigInt));
  const modular = coprimeOverFinite(primeField(BigInt(p)), images, budget, doing);
  const divisors = modular.base.map((g) => g.map(Number));
  const keysOf = (f: IntegerPolynomial, among: readonly number[]): readonly number[] => {
    const image = residuesModulo(f, p);
    return among.filter((key) => ring.degree(ring.gcd(image, divisors[key]!)) > 0);
  };
  const pieces = new CoprimePieces<IntegerPolynomial>(
    {
      degree: (f) => f.length - 1,
      gcd: (f, g) => gcdIntegers(f, g, spend),
      quotient: (f, g) => exactQuotient(f, g, spend)!,
      keysOf,
    },
    spend,
  );
  const parts = list.map((f, i) => {
    const keys = modular.exponents[i]!.map(({ index }) => index);
    const found = squareFreeIntegers(f, spend);
    return found.map(({ factor, exponent }) => ({
      factor,
      exponent,
      keys: found.length === 1 ? keys : keysOf(factor, keys),
    }));
  });
  for (const part of parts.flat()) pieces.insert(part.factor, part.keys);
  const base = [...pieces.values()].sort(compareIntegerPolynomials);
  const places = new Map(base.map((value, i) => [value, i]));
  const exponents = parts.map((own) =>
    own
      .flatMap(({ factor, exponent, keys }) =>
        pieces
          .sharing(keys)
          .filter(({ value }) => exactQuotient(factor, value, spend) !== undefined)
          .map(({ value }) => ({ index: places.get(value)!, exponent })),
      )
      .sort((a, b) => a.index - b.index),
  );
  return { base, exponents };
}

/** The first prime below 2^25 that divides no leading coefficient. */
function primeFor(list: readonly IntegerPolynomial[], spend: () => void): number {
  for (let place = 0; ; place++) {
    spend();
    const p = wordPrime(place);
    if (list.every((f) => f[f.length - 1]! % BigInt(p) !== 0n)) return p;
  }
}
