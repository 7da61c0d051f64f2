import { bitLength } from '../arith/bits';
import { integerRoot } from '../arith/roots';
import type { IntegerPolynomial } from './integer-polynomial';

/**
 * A bound on the coefficients of lc(f)/lc(g)·g for every divisor g of f over ℤ of degree at most d: by M. Mignotte, An inequality about
 * factors of polynomials, Math. Comp. 28 (1974), they are at most the middle binomial coefficient of d times the Euclidean length of f.
 */
export function divisorBound(f: IntegerPolynomial, d: number): bigint {
  let binomial = 1n;
  const half = (d - (d & 1)) / 2;
  for (let i = 1; i <= half; i++) binomial = (binomial * BigInt(d - i + 1)) / BigInt(i);
  const squares = f.reduce((sum, c) => sum + c * c, 0n);
  return binomial * (integerRoot(squares, 2) + 1n);
}

/**
 * An exponent e, possibly negative, such that every complex root of f of degree ≥ 1 is at most 2^e in size: twice the largest
 * |f_(n−i)/f_n|^(1/i) is such a bound (M. Fujiwara 1916).
 */
export function rootExponent(f: IntegerPolynomial): number {
  const n = f.length - 1;
  const top = bitLength(f[n]!);
  let largest: number | undefined;
  for (let i = 1; i <= n; i++) {
    const c = f[n - i]!;
    if (c === 0n) continue;
    const bits = bitLength(c) - top + 1;
    const remainder = ((bits % i) + i) % i;
    const exponent = (bits - remainder) / i + (remainder === 0 ? 0 : 1);
    if (largest === undefined || exponent > largest) largest = exponent;
  }
  return largest === undefined ? 0 : largest + 1;
}
