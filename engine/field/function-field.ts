import { integerElement, letterElement, quotientElement } from '../expression/element';
import { elementTex } from '../expression/to-tex';
import type { Field } from './field';
import { addPolynomials, constant, monic, negatePolynomial, scalePolynomial, type Polynomial } from './polynomial';
import type { PolynomialTools } from './polynomial-tools';
import { writePolynomial } from './write-polynomial';

/** A rational function in lowest terms, the denominator monic; 0 is 0/1. */
export interface RationalFunction<E> {
  readonly num: Polynomial<E>;
  readonly den: Polynomial<E>;
}

/** The field k(t) of rational functions in one variable over a field k. */
export interface FunctionField<E> extends Field<RationalFunction<E>> {
  readonly base: Field<E>;
  /** The letter that stands for the variable. */
  readonly generator: string;
  readonly tools: PolynomialTools<E>;
  /** num/den in lowest terms. Throws a RangeError for den = 0. */
  fraction(num: Polynomial<E>, den: Polynomial<E>): RationalFunction<E>;
}

/**
 * k(letter) over any field k that does not have the letter. Degrees are not bounded here: callers measure what they ask for.
 * Sums and products by small greatest common divisors: D. Knuth, The Art of Computer Programming 2, section 4.5.1.
 */
export function functionField<E>(base: Field<E>, letter: string, tools: PolynomialTools<E>): FunctionField<E> {
  type R = RationalFunction<E>;
  const one: Polynomial<E> = [base.one];
  const isOne = (f: Polynomial<E>): boolean => f.length === 1 && base.equal(f[0]!, base.one);
  const whole = (num: Polynomial<E>): R => ({ num, den: one });
  const { multiply, quotient, gcd } = tools;
  const reduced = (num: Polynomial<E>, den: Polynomial<E>): R => {
    if (isOne(den)) return whole(num);
    if (num.length === 0) return whole(num);
    const common = gcd(num, den);
    return common.length === 1 ? { num, den } : { num: quotient(num, common), den: quotient(den, common) };
  };
  const fraction = (num: Polynomial<E>, den: Polynomial<E>): R => {
    if (den.length === 0) throw new RangeError('division by the zero polynomial');
    const lead = den[den.length - 1]!;
    const unitary = monic(base, den);
    return reduced(unitary === den ? num : scalePolynomial(base, base.inverse(lead), num), unitary);
  };

  const add = (a: R, b: R): R => {
    if (isOne(a.den) && isOne(b.den)) return whole(addPolynomials(base, a.num, b.num));
    const common = gcd(a.den, b.den);
    const [left, right] = [quotient(a.den, common), quotient(b.den, common)];
    const num = addPolynomials(base, multiply(a.num, right), multiply(b.num, left));
    const last = gcd(num, common);
    return num.length === 0 ? whole(num) : { num: quotient(num, last), den: multiply(left, quotient(b.den, last)) };
  };
  const product = (a: R, b: R): R => {
    if (isOne(a.den) && isOne(b.den)) return whole(multiply(a.num, b.num));
    const [x, y] = [reduced(a.num, b.den), reduced(b.num, a.den)];
    return { num: multiply(x.num, y.num), den: multiply(x.den, y.den) };
  };
  const negate = (a: R): R => ({ num: negatePolynomial(base, a.num), den: a.den });
  const same = (f: Polynomial<E>, g: Polynomial<E>): boolean =>
    f.length === g.length && f.every((c, i) => base.equal(c, g[i]!));
  const inverse = (a: R): R => {
    if (a.num.length === 0) throw new RangeError('0 has no inverse');
    const lead = base.inverse(a.num[a.num.length - 1]!);
    return { num: scalePolynomial(base, lead, a.den), den: monic(base, a.num) };
  };

  return Object.freeze<FunctionField<E>>({
    name: `${base.name}(${letter})`,
    tex: `${base.tex}(${elementTex(letterElement(letter))})`,
    base,
    generator: letter,
    tools,
    fraction,
    characteristic: base.characteristic,
    zero: whole([]),
    one: whole(one),
    add,
    subtract: (a, b) => add(a, negate(b)),
    multiply: product,
    negate,
    inverse,
    isZero: (a) => a.num.length === 0,
    equal: (a, b) => same(a.num, b.num) && same(a.den, b.den),
    fromInteger: (n) => whole(constant(base, base.fromInteger(n))),
    letter(name) {
      if (name === letter) return whole([base.zero, base.one]);
      const below = base.letter(name);
      return below && whole(constant(base, below));
    },
    write(a) {
      const num = a.num.length === 0 ? integerElement(0n) : writePolynomial(base, a.num, letter);
      return isOne(a.den) ? num : quotientElement(num, writePolynomial(base, a.den, letter));
    },
    /** Numerator and denominator stay coprime. */
    power(a, n) {
      const { num, den } = n < 0n ? inverse(a) : a;
      const size = n < 0n ? -n : n;
      return { num: polynomialPower(tools, one, num, size), den: polynomialPower(tools, one, den, size) };
    },
  });
}

/** f^n for n ≥ 0, by squaring. */
export function polynomialPower<E>(
  tools: PolynomialTools<E>,
  one: Polynomial<E>,
  f: Polynomial<E>,
  n: bigint,
): Polynomial<E> {
  if (n === 0n) return one;
  let result = f;
  for (const bit of n.toString(2).slice(1)) {
    result = tools.multiply(result, result);
    if (bit === '1') result = tools.multiply(result, f);
  }
  return result;
}
