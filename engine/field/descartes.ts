import { rootExponent } from './factor-bounds';
import type { IntegerPolynomial } from './integer-polynomial';

/** The open interval between numerator/2^exponent and (numerator + 1)/2^exponent; the exponent may be negative. */
export interface Dyadic {
  readonly numerator: bigint;
  readonly exponent: number;
}

/** f(x + 1) */
export function shiftedByOne(f: IntegerPolynomial, spend: () => void): bigint[] {
  const g = f.slice();
  for (let i = 0; i < g.length - 1; i++) {
    spend();
    for (let j = g.length - 2; j >= i; j--) g[j]! += g[j + 1]!;
  }
  return g;
}

/**
 * The number of sign changes among the coefficients of (1+x)^n f(1/(1+x)): at least the number of roots of f between 0 and 1, with
 * multiplicity, and equal to it when it is 0 or 1. Descartes' rule of signs.
 */
export function signChanges(f: IntegerPolynomial, spend: () => void): number {
  const g = shiftedByOne(f.slice().reverse(), spend);
  let changes = 0;
  let last = 0n;
  for (const c of g) {
    if (c === 0n) continue;
    if (last !== 0n && c < 0n !== last < 0n) changes++;
    last = c;
  }
  return changes;
}

/** 2^(n·exponent)·f of the interval's points, so that the interval becomes the one from 0 to 1. */
export function seenFrom(f: IntegerPolynomial, { numerator, exponent }: Dyadic, spend: () => void): IntegerPolynomial {
  const scaled = scaledBy(f, -exponent);
  const n = scaled.length - 1;
  // f(x + numerator) by repeated division
  const g = scaled.slice();
  for (let i = 0; i < n; i++) {
    spend();
    for (let j = n - 1; j >= i; j--) g[j]! += numerator * g[j + 1]!;
  }
  return g;
}

/** A positive multiple over ℤ of f(2^e·x). */
function scaledBy(f: IntegerPolynomial, e: number): IntegerPolynomial {
  const n = f.length - 1;
  return e >= 0 ? f.map((c, i) => c << BigInt(e * i)) : f.map((c, i) => c << BigInt(-e * (n - i)));
}

/** The sign of f at numerator/2^exponent. */
export function signAt(f: IntegerPolynomial, { numerator, exponent }: Dyadic): -1 | 0 | 1 {
  const step = BigInt(exponent > 0 ? exponent : 0);
  const point = exponent < 0 ? numerator << BigInt(-exponent) : numerator;
  let value = 0n;
  let scale = 0n;
  for (let i = f.length - 1; i >= 0; i--) {
    value = value * point + (f[i]! << scale);
    scale += step;
  }
  return value > 0n ? 1 : value < 0n ? -1 : 0;
}

/** Isolating intervals, ascending, or a dyadic root that was met on the way. */
type Found = { readonly intervals: readonly Dyadic[] } | { readonly root: Dyadic };

/**
 * Intervals that hold one root each of a square-free f with f(0) ≠ 0, for all its roots > 0. Bisection with Descartes' rule:
 * G. Collins, A. Akritas, Polynomial real root isolation using Descartes' rule of signs, SYMSAC 1976.
 */
export function positiveRoots(f: IntegerPolynomial, spend: () => void): Found {
  const bound = rootExponent(f) + 1;
  const intervals: Dyadic[] = [];
  const open: { readonly f: IntegerPolynomial; readonly at: Dyadic }[] = [
    { f: scaledBy(f, bound), at: { numerator: 0n, exponent: -bound } },
  ];
  for (let next = open.pop(); next !== undefined; next = open.pop()) {
    spend();
    const changes = signChanges(next.f, spend);
    if (changes === 0) continue;
    if (changes === 1) {
      intervals.push(next.at);
      continue;
    }
    const numerator = 2n * next.at.numerator;
    const exponent = next.at.exponent + 1;
    const left = scaledBy(next.f, -1);
    const right = shiftedByOne(left, spend);
    if (right[0] === 0n) return { root: { numerator: numerator + 1n, exponent } };
    open.push({ f: right, at: { numerator: numerator + 1n, exponent } });
    open.push({ f: left, at: { numerator, exponent } });
  }
  return { intervals };
}
