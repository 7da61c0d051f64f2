import { bitLength } from '../arith/bits';
import { gcd } from '../arith/gcd';
import { integerElement, negateElement, quotientElement, type Element } from '../expression/element';
import type { Field } from './field';

/** A rational number in lowest terms, the denominator positive; 0 is 0/1. */
export interface Rational {
  readonly num: bigint;
  readonly den: bigint;
}

/** num/den in lowest terms. Throws a RangeError for den = 0. */
export function rational(num: bigint, den = 1n): Rational {
  if (den === 0n) throw new RangeError('division by zero');
  if (den === 1n) return { num, den };
  const common = gcd(num, den);
  const sign = den < 0n ? -common : common;
  return { num: num / sign, den: den / sign };
}

/** Sums and products of fractions by small gcds: D. Knuth, The Art of Computer Programming 2, section 4.5.1. */
function sum(a: Rational, b: Rational): Rational {
  if (a.den === 1n && b.den === 1n) return { num: a.num + b.num, den: 1n };
  const common = gcd(a.den, b.den);
  if (common === 1n) return { num: a.num * b.den + b.num * a.den, den: a.den * b.den };
  const num = a.num * (b.den / common) + b.num * (a.den / common);
  const last = gcd(num, common);
  return { num: num / last, den: (a.den / common) * (b.den / last) };
}

function product(a: Rational, b: Rational): Rational {
  if (a.den === 1n && b.den === 1n) return { num: a.num * b.num, den: 1n };
  const across = gcd(a.num, b.den);
  const back = gcd(b.num, a.den);
  return { num: (a.num / across) * (b.num / back), den: (a.den / back) * (b.den / across) };
}

const negative = (a: Rational): Rational => ({ num: -a.num, den: a.den });

function write(a: Rational): Element {
  const size = integerElement(a.num < 0n ? -a.num : a.num);
  const fraction = a.den === 1n ? size : quotientElement(size, integerElement(a.den));
  return a.num < 0n ? negateElement(fraction) : fraction;
}

/** The field ℚ. */
export const rationals: Field<Rational> = Object.freeze({
  name: 'Q',
  tex: '\\mathbb{Q}',
  characteristic: 0n,
  zero: { num: 0n, den: 1n },
  one: { num: 1n, den: 1n },
  add: sum,
  subtract: (a: Rational, b: Rational) => sum(a, negative(b)),
  multiply: product,
  negate: negative,
  inverse(a: Rational) {
    if (a.num === 0n) throw new RangeError('0 has no inverse');
    return a.num < 0n ? { num: -a.den, den: -a.num } : { num: a.den, den: a.num };
  },
  isZero: (a: Rational) => a.num === 0n,
  equal: (a: Rational, b: Rational) => a.num === b.num && a.den === b.den,
  fromInteger: (n: bigint) => ({ num: n, den: 1n }),
  letter: () => undefined,
  write,
  /** Numerator and denominator stay coprime. */
  power(a: Rational, n: bigint) {
    if (n >= 0n) return { num: a.num ** n, den: a.den ** n };
    if (a.num === 0n) throw new RangeError('0 has no inverse');
    const sign = a.num < 0n ? -1n : 1n;
    return { num: (sign * a.den) ** -n, den: (sign * a.num) ** -n };
  },
  size(a: Rational) {
    const top = bitLength(a.num);
    const bottom = bitLength(a.den);
    return top > bottom ? top : bottom;
  },
});
