import { bitLength } from '../arith/bits';
import { gcd } from '../arith/gcd';
import { inverseModulo, powerModulo } from '../arith/modular';
import type { Span } from '../expression/span';
import { Refusal } from '../expression/refusal';
import {
  coefficientsIn,
  collected,
  constantPolynomial,
  isConstant,
  keyOf,
  letterPower,
  multiplyMulti,
  powerMulti,
  reduced,
  type LetterRing,
  type MultiPolynomial,
  type MultiTerm,
} from './multivariate';
import { normalized } from './multivariate-division';
import { rationals, type Rational } from './rational';
import { SIZE_LIMIT, tooLarge } from './read-element';

/** A power of a polynomial that is normalized and no constant. */
export interface FunctionFactor {
  readonly base: MultiPolynomial;
  readonly exponent: bigint;
}

/**
 * A rational function in letters over ℚ or 𝔽_p, as a constant times powers of polynomials, which are not multiplied out and need not
 * be coprime; letters stand among them as themselves. It is zero iff the constant is. In characteristic p the constant is an
 * integer 0 … p − 1 over 1.
 */
export interface LetterFunction {
  readonly constant: Rational;
  readonly factors: ReadonlyMap<string, FunctionFactor>;
}

const none: ReadonlyMap<string, FunctionFactor> = new Map();

/** A constant; in characteristic p its denominator must be prime to p. */
export function constantFunction(ring: LetterRing, value: Rational): LetterFunction {
  const p = ring.characteristic;
  if (p === 0n) return { constant: value, factors: none };
  const num = reduced(ring, value.den === 1n ? value.num : value.num * inverseModulo(value.den, p));
  return { constant: { num, den: 1n }, factors: none };
}

/** A polynomial, its letters taken out. */
export function polynomialFunction(ring: LetterRing, f: MultiPolynomial): LetterFunction {
  if (f.length === 0) return constantFunction(ring, rationals.zero);
  const { unit, primitive } = normalized(ring, f);
  const factors = new Map<string, FunctionFactor>();
  const least = ring.letters.map((_, i) => Math.min(...primitive.map(({ exponents }) => exponents[i] ?? 0)));
  least.forEach((e, i) => {
    if (e > 0) put(factors, letterPower(ring, i), BigInt(e));
  });
  const rest = primitive.map(({ exponents, coefficient }) => ({
    exponents: exponents.map((e, i) => e - (least[i] ?? 0)),
    coefficient,
  }));
  if (!isConstant(rest)) put(factors, rest, 1n);
  return { constant: { num: unit, den: 1n }, factors };
}

function put(factors: Map<string, FunctionFactor>, base: MultiPolynomial, exponent: bigint): void {
  const key = keyOf(base);
  const sum = exponent + (factors.get(key)?.exponent ?? 0n);
  if (sum === 0n) factors.delete(key);
  else factors.set(key, { base, exponent: sum });
}

export const isZeroFunction = (f: LetterFunction): boolean => f.constant.num === 0n;

export function multiplyFunctions(ring: LetterRing, f: LetterFunction, g: LetterFunction): LetterFunction {
  const { constant } = constantFunction(ring, rationals.multiply(f.constant, g.constant));
  if (constant.num === 0n) return { constant, factors: none };
  if (g.factors.size === 0) return { constant: measured(constant), factors: f.factors };
  const factors = new Map(f.factors);
  for (const { base, exponent } of g.factors.values()) put(factors, base, exponent);
  return { constant: measured(constant), factors };
}

export const negateFunction = (ring: LetterRing, f: LetterFunction): LetterFunction => ({
  constant: constantFunction(ring, rationals.negate(f.constant)).constant,
  factors: f.factors,
});

/** f^n for any integer n, f not zero if n < 0. Nothing is multiplied out; the constant is measured before it is raised. */
export function powerFunction(ring: LetterRing, f: LetterFunction, n: bigint, at?: Span): LetterFunction {
  if (n === 0n) return constantFunction(ring, rationals.one);
  const factors = new Map([...f.factors].map(([key, { base, exponent }]) => [key, { base, exponent: exponent * n }]));
  const p = ring.characteristic;
  if (p !== 0n) return { constant: { num: powerModulo(f.constant.num, n, p), den: 1n }, factors };
  const bits = BigInt(Math.max(bitLength(f.constant.num), bitLength(f.constant.den)));
  if ((bits - 1n) * (n < 0n ? -n : n) > BigInt(SIZE_LIMIT)) throw tooLarge(at);
  const { num, den } = f.constant;
  if (n > 0n) return { constant: { num: num ** n, den: den ** n }, factors };
  const sign = num < 0n ? -1n : 1n;
  return { constant: { num: (sign * den) ** -n, den: (sign * num) ** -n }, factors };
}

/** The sum: what all summands have in common stays in front, the rest is multiplied out over one denominator. */
export function sumFunctions(ring: LetterRing, summands: readonly LetterFunction[]): LetterFunction {
  const list = summands.filter((f) => !isZeroFunction(f));
  const [first] = list;
  if (first === undefined) return constantFunction(ring, rationals.zero);
  if (list.length === 1) return first;
  const common = new Map<string, FunctionFactor>();
  for (const { factors } of list)
    for (const [key, { base }] of factors) {
      if (common.has(key)) continue;
      const exponents = list.map((f) => f.factors.get(key)?.exponent ?? 0n);
      common.set(key, { base, exponent: exponents.reduce((a, e) => (e < a ? e : a)) });
    }
  const den = list.reduce((least, { constant }) => (least / gcd(least, constant.den)) * constant.den, 1n);
  const terms: MultiTerm[] = [];
  for (const { constant, factors } of list) {
    let summand = constantPolynomial(ring, constant.num * (den / constant.den));
    for (const [key, { base, exponent }] of common) {
      const left = (factors.get(key)?.exponent ?? 0n) - exponent;
      if (left > 0n) summand = multiplyMulti(ring, summand, powerMulti(ring, base, exponentOf(left)));
    }
    terms.push(...summand);
  }
  const whole = polynomialFunction(ring, collected(ring, terms));
  const over = constantFunction(ring, { num: 1n, den });
  const front = new Map([...common].filter(([, { exponent }]) => exponent !== 0n));
  return multiplyFunctions(ring, multiplyFunctions(ring, whole, over), { constant: rationals.one, factors: front });
}

function exponentOf(e: bigint): number {
  if (e <= 1_000_000n) return Number(e);
  throw new Refusal('size', 'An exponent inside a sum is past 1000000. Use smaller exponents.');
}

function measured(value: Rational): Rational {
  if (bitLength(value.num) > SIZE_LIMIT || bitLength(value.den) > SIZE_LIMIT) throw tooLarge(undefined);
  return value;
}

/** The polynomial with one letter replaced by a function, for a polynomial in which the letter occurs to a small degree. */
export function substituteLetter(
  ring: LetterRing,
  f: MultiPolynomial,
  letter: number,
  value: LetterFunction,
): LetterFunction {
  const terms = [...coefficientsIn(f, letter)].map(([e, coefficient]) =>
    multiplyFunctions(ring, polynomialFunction(ring, coefficient), powerFunction(ring, value, BigInt(e))),
  );
  return sumFunctions(ring, terms);
}

/** A function with one letter replaced by a function; `undefined` at a pole. */
export function substituteInFunction(
  ring: LetterRing,
  f: LetterFunction,
  letter: number,
  value: LetterFunction,
): LetterFunction | undefined {
  let result = constantFunction(ring, f.constant);
  for (const { base, exponent } of f.factors.values()) {
    const factor = substituteLetter(ring, base, letter, value);
    if (isZeroFunction(factor) && exponent < 0n) return undefined;
    result = multiplyFunctions(ring, result, powerFunction(ring, factor, exponent));
  }
  return result;
}
