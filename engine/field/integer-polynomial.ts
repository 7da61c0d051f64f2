import { gcd } from '../arith/gcd';
import type { Polynomial } from './polynomial';
import { rational, type Rational } from './rational';

/** A polynomial over ℤ: coefficients from the constant term up, the last one not zero; [] is zero. */
export type IntegerPolynomial = readonly bigint[];

/** The greatest common divisor of the coefficients, never negative. */
export function content(f: IntegerPolynomial): bigint {
  let common = 0n;
  for (let i = f.length - 1; i >= 0 && common !== 1n; i--) common = gcd(common, f[i]!);
  return common;
}

/** f ≠ 0 divided by its content, the leading coefficient made positive; zero stays zero. */
export function primitivePart(f: IntegerPolynomial): IntegerPolynomial {
  if (f.length === 0) return f;
  const common = f[f.length - 1]! < 0n ? -content(f) : content(f);
  return common === 1n ? f : f.map((c) => c / common);
}

/** f = unit · primitive, for f ≠ 0 over ℚ; primitive has content 1 and a positive leading coefficient. */
export function primitiveOfRational(f: Polynomial<Rational>): {
  readonly unit: Rational;
  readonly primitive: IntegerPolynomial;
} {
  let denominator = 1n;
  for (const { den } of f) denominator *= den / gcd(denominator, den);
  const whole = f.map(({ num, den }) => num * (denominator / den));
  const primitive = primitivePart(whole);
  return { unit: rational(whole[whole.length - 1]! / primitive[primitive.length - 1]!, denominator), primitive };
}

/** f ≠ 0 divided by its leading coefficient, over ℚ. */
export const monicRational = (f: IntegerPolynomial): Polynomial<Rational> =>
  f.map((c) => rational(c, f[f.length - 1]!));

export function multiplyIntegers(f: IntegerPolynomial, g: IntegerPolynomial): IntegerPolynomial {
  if (f.length === 0 || g.length === 0) return [];
  const product = new Array<bigint>(f.length + g.length - 1).fill(0n);
  for (let i = 0; i < f.length; i++) {
    const c = f[i]!;
    if (c !== 0n) for (let j = 0; j < g.length; j++) product[i + j]! += c * g[j]!;
  }
  return product;
}

/** f/g over ℤ, for g ≠ 0; `undefined` when it is no polynomial over ℤ. `spend` is called at each step. */
export function exactQuotient(
  f: IntegerPolynomial,
  g: IntegerPolynomial,
  spend: () => void = () => undefined,
): IntegerPolynomial | undefined {
  if (f.length === 0) return f;
  const n = g.length - 1;
  if (f.length <= n) return undefined;
  if (g[0] === 0n ? f[0] !== 0n : f[0]! % g[0]! !== 0n) return undefined;
  const lead = g[n]!;
  const rest = f.slice();
  const quotient = new Array<bigint>(f.length - n).fill(0n);
  for (let top = f.length - 1; top >= n; top--) {
    const head = rest[top]!;
    if (head === 0n) continue;
    spend();
    const c = head / lead;
    if (c * lead !== head) return undefined;
    quotient[top - n] = c;
    for (let j = 0; j < n; j++) rest[top - n + j]! -= c * g[j]!;
  }
  for (let i = 0; i < n; i++) if (rest[i] !== 0n) return undefined;
  return quotient;
}

export function derivativeInteger(f: IntegerPolynomial): IntegerPolynomial {
  return f.slice(1).map((c, i) => c * BigInt(i + 1));
}

/** The order of polynomials over ℤ: by degree, then by the coefficients from the top. */
export function compareIntegerPolynomials(f: IntegerPolynomial, g: IntegerPolynomial): number {
  if (f.length !== g.length) return f.length - g.length;
  for (let i = f.length - 1; i >= 0; i--) if (f[i] !== g[i]) return f[i]! < g[i]! ? -1 : 1;
  return 0;
}
