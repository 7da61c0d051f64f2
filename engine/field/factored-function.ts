import { addInt, multiplyInt, negateInt, toInt, type Int } from '../arith/int';
import { Refusal } from '../expression/refusal';
import type { Field } from './field';
import { polynomialPower, type FunctionField, type RationalFunction } from './function-field';
import { addPolynomials, scalePolynomial, type Polynomial } from './polynomial';
import { SIZE_LIMIT, tooLarge } from './read-element';

/**
 * A rational function as it was written: constant · ∏ baseᵉ, the bases of degree ≥ 1, neither irreducible nor coprime. 0 is the
 * constant 0 without bases. Exponents are of any size.
 */
export interface FactoredFunction<E> {
  readonly constant: E;
  readonly powers: readonly FunctionPower<E>[];
}

export interface FunctionPower<E> {
  readonly base: Polynomial<E>;
  readonly exponent: Int;
}

/** The field of functions as they are written. */
export interface FactoredFunctions<E> extends Field<FactoredFunction<E>> {
  /** The same function in lowest terms. Refused (`size`) when it is too large to be multiplied out. */
  expand(a: FactoredFunction<E>): RationalFunction<E>;
}

/** Sums are not multiplied out past this degree. */
const DEGREE_LIMIT = 10_000;

/** The binary digits of all coefficients of a polynomial that is multiplied out, at most. */
const TOTAL_LIMIT = 1 << 28;

/**
 * k(t) for reading entries: products and powers are kept as they are written, so that they cost nothing and need not be taken
 * apart again. Only sums are multiplied out, after their degree and their coefficients have been measured; past degree 10 000 they
 * are refused (`size`).
 */
export function factoredFunctions<E>(functions: FunctionField<E>): FactoredFunctions<E> {
  type F = FactoredFunction<E>;
  const { base, tools } = functions;
  const one: Polynomial<E> = [base.one];
  const variable: Polynomial<E> = [base.zero, base.one];
  const whole = (constant: E): F => ({ constant, powers: [] });
  const zero = whole(base.zero);

  const polynomial = (f: Polynomial<E>): F => {
    if (f.length <= 1) return f.length === 0 ? zero : whole(f[0]!);
    return { constant: base.one, powers: [{ base: f, exponent: 1 }] };
  };
  /** The product of the powers with exponents of one sign, multiplied out. */
  const multiplied = (powers: readonly FunctionPower<E>[]): Polynomial<E> => {
    const [first, second] = powers;
    if (first === undefined) return one;
    if (second === undefined && first.exponent === 1) return first.base;
    measure(base, powers);
    return powers
      .map(({ base: f, exponent }) =>
        f === variable
          ? [...new Array<E>(Number(exponent)).fill(base.zero), base.one]
          : polynomialPower(tools, one, f, BigInt(exponent)),
      )
      .reduce((f, g) => tools.multiply(f, g));
  };
  const numerator = ({ constant, powers }: F): Polynomial<E> => {
    const f = multiplied(powers.filter(({ exponent }) => exponent > 0));
    return base.equal(constant, base.one) ? f : scalePolynomial(base, constant, f);
  };
  const denominator = ({ powers }: F): Polynomial<E> =>
    multiplied(powers.filter(({ exponent }) => exponent < 0).map((p) => ({ ...p, exponent: negateInt(p.exponent) })));
  const isWhole = ({ powers }: F): boolean => powers.every(({ exponent }) => exponent > 0);
  const expand = (a: F): RationalFunction<E> => functions.fraction(numerator(a), denominator(a));

  const add = (a: F, b: F): F => {
    if (base.isZero(a.constant)) return b;
    if (base.isZero(b.constant)) return a;
    if (isWhole(a) && isWhole(b)) return polynomial(addPolynomials(base, numerator(a), numerator(b)));
    const { num, den } = functions.add(expand(a), expand(b));
    return multiply(polynomial(num), invert(polynomial(den)));
  };
  const multiply = (a: F, b: F): F => {
    if (base.isZero(a.constant) || base.isZero(b.constant)) return zero;
    const constant = base.multiply(a.constant, b.constant);
    if (a.powers.length === 0) return { constant, powers: b.powers };
    if (b.powers.length === 0) return { constant, powers: a.powers };
    const powers = [...a.powers];
    for (const power of b.powers) {
      const at = powers.findIndex(({ base: f }) => f === power.base);
      if (at < 0) powers.push(power);
      else powers[at] = { base: power.base, exponent: addInt(powers[at]!.exponent, power.exponent) };
    }
    return { constant, powers: powers.filter(({ exponent }) => exponent !== 0) };
  };
  const invert = ({ constant, powers }: F): F => ({
    constant: base.inverse(constant),
    powers: powers.map(({ base: f, exponent }) => ({ base: f, exponent: negateInt(exponent) })),
  });
  const negate = ({ constant, powers }: F): F => ({ constant: base.negate(constant), powers });
  const constantPower = (c: E, n: bigint): E => {
    if (base.power !== undefined) return base.power(c, n);
    let result = base.one;
    for (const bit of n.toString(2)) {
      result = base.multiply(result, result);
      if (bit === '1') result = base.multiply(result, c);
    }
    return result;
  };

  return Object.freeze<FactoredFunctions<E>>({
    expand,
    name: functions.name,
    tex: functions.tex,
    characteristic: functions.characteristic,
    zero,
    one: whole(base.one),
    add,
    subtract: (a, b) => add(a, negate(b)),
    multiply,
    negate,
    inverse: invert,
    isZero: ({ constant }) => base.isZero(constant),
    equal: (a, b) =>
      base.isZero(b.constant)
        ? base.isZero(a.constant)
        : functions.equal(expand(multiply(a, invert(b))), functions.one),
    fromInteger: (n) => whole(base.fromInteger(n)),
    letter(name) {
      if (name === functions.generator) return { constant: base.one, powers: [{ base: variable, exponent: 1 }] };
      const below = base.letter(name);
      return below && whole(below);
    },
    write: (a) => functions.write(expand(a)),
    power(a, n) {
      if (n === 0n) return whole(base.one);
      const { constant, powers } = n < 0n ? invert(a) : a;
      const size = n < 0n ? -n : n;
      return {
        constant: constantPower(constant, size),
        powers: powers.map(({ base: f, exponent }) => ({ base: f, exponent: multiplyInt(exponent, toInt(size)) })),
      };
    },
    ...(base.size && { size: ({ constant }: F) => base.size?.(constant) ?? 0 }),
  });
}

/** Refuses a product of powers, exponents positive, that is too large to be multiplied out. */
function measure<E>(base: Field<E>, powers: readonly FunctionPower<E>[]): void {
  let degree: Int = 0;
  let bits: Int = 0;
  for (const { base: f, exponent } of powers) {
    degree = addInt(degree, multiplyInt(exponent, f.length - 1));
    if (base.size === undefined) continue;
    // the powers of a monomial have one coefficient
    if (f.every((c, i) => i === f.length - 1 || base.isZero(c))) {
      bits = addInt(bits, multiplyInt(exponent, base.size(f[f.length - 1]!) - 1));
      continue;
    }
    const largest = f.reduce((most, c) => Math.max(most, base.size?.(c) ?? 0), 0);
    bits = addInt(bits, multiplyInt(exponent, largest + 32 - Math.clz32(f.length)));
  }
  if (degree > DEGREE_LIMIT)
    throw new Refusal(
      'size',
      'A sum in an entry has a degree past 10 000. Write entries as products of factors of smaller degree.',
    );
  if (bits > SIZE_LIMIT || multiplyInt(bits, addInt(degree, 1)) > TOTAL_LIMIT) throw tooLarge(undefined);
}
