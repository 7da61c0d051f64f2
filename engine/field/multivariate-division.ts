import { gcd } from '../arith/gcd';
import { inverseModulo } from '../arith/modular';
import {
  addMulti,
  compareExponents,
  multiplyMulti,
  reduced,
  scaleMulti,
  spendOn,
  type LetterRing,
  type MultiPolynomial,
  type MultiTerm,
} from './multivariate';

/** f = unit · primitive. */
export interface Normalized {
  readonly unit: bigint;
  readonly primitive: MultiPolynomial;
}

/**
 * f ≠ 0 without its unit: over ℤ the primitive part with a positive first coefficient, over 𝔽_p the monic multiple. Polynomials
 * that differ by a constant have the same one.
 */
export function normalized(ring: LetterRing, f: MultiPolynomial): Normalized {
  const first = f[0]?.coefficient;
  if (first === undefined) throw new RangeError('0 has no primitive part');
  if (ring.characteristic !== 0n) {
    if (first === 1n) return { unit: 1n, primitive: f };
    return { unit: first, primitive: scaleMulti(ring, inverseModulo(first, ring.characteristic), f) };
  }
  let content = 0n;
  for (const { coefficient } of f) {
    content = gcd(content, coefficient);
    if (content === 1n) break;
  }
  const unit = first < 0n ? -content : content;
  if (unit === 1n) return { unit, primitive: f };
  const primitive = f.map(({ exponents, coefficient }) => ({ exponents, coefficient: coefficient / unit }));
  return { unit, primitive };
}

/** f / g where g ≠ 0 divides f; `undefined` where it does not. By first terms. */
export function exactQuotient(ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial): MultiPolynomial | undefined {
  const divisor = g[0];
  if (divisor === undefined) throw new RangeError('division by the zero polynomial');
  const quotient: MultiTerm[] = [];
  let rest = f;
  for (let first = rest[0]; first !== undefined; first = rest[0]) {
    spendOn(ring, rest.length + g.length, 'dividing polynomials in several letters');
    const exponents = first.exponents.map((e, i) => e - (divisor.exponents[i] ?? 0));
    if (exponents.some((e) => e < 0)) return undefined;
    const coefficient = quotientOf(ring, first.coefficient, divisor.coefficient);
    if (coefficient === undefined) return undefined;
    const term = { exponents, coefficient };
    quotient.push(term);
    rest = addMulti(ring, rest, multiplyMulti(ring, [{ ...term, coefficient: reduced(ring, -coefficient) }], g));
  }
  return quotient.sort((a, b) => compareExponents(b.exponents, a.exponents));
}

function quotientOf(ring: LetterRing, a: bigint, b: bigint): bigint | undefined {
  if (ring.characteristic !== 0n) return reduced(ring, a * inverseModulo(b, ring.characteristic));
  return a % b === 0n ? a / b : undefined;
}

/** How often g, not constant, divides f ≠ 0, and what is left. */
export function multiplicity(
  ring: LetterRing,
  f: MultiPolynomial,
  g: MultiPolynomial,
): { readonly exponent: number; readonly rest: MultiPolynomial } {
  let rest = f;
  let exponent = 0;
  for (;;) {
    const quotient = exactQuotient(ring, rest, g);
    if (quotient === undefined) return { exponent, rest };
    rest = quotient;
    exponent += 1;
  }
}
