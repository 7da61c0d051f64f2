import {
  integerElement,
  negateElement,
  powerElement,
  productElement,
  quotientElement,
  type Element,
} from '../expression/element';
import { Refusal } from '../expression/refusal';
import type { LetterFunction } from './letter-function';
import { scaleMulti, type LetterRing } from './multivariate';
import { leastSize, writeMultivariate, writtenSign } from './write-multivariate';

/** A function as it is written: powers of its factors over one another, a sign and the constant in front. */
export function writeLetterFunction(ring: LetterRing, f: LetterFunction): Element {
  let num = leastSize(ring, f.constant.num);
  const above: Element[] = [];
  const below: Element[] = [];
  for (const { base, exponent } of f.factors.values()) {
    const sign = writtenSign(ring, base);
    if (sign < 0 && exponent % 2n !== 0n) num = -num;
    const size = exponent < 0n ? -exponent : exponent;
    if (size > 1_000_000n) throw new Refusal('size', 'An exponent is past 1000000. Use smaller exponents.');
    const element = writeMultivariate(ring, scaleMulti(ring, BigInt(sign), base));
    (exponent > 0n ? above : below).push(size === 1n ? element : powerElement(element, Number(size)));
  }
  const [size, den] = [num < 0n ? -num : num, f.constant.den];
  const top = product(size === 1n && above.length > 0 ? above : [integerElement(size), ...above]);
  const bottom = product(den === 1n ? below : [integerElement(den), ...below]);
  const whole = den === 1n && below.length === 0 ? top : quotientElement(top, bottom);
  return num < 0n ? negateElement(whole) : whole;
}

const product = (factors: readonly Element[]): Element =>
  factors.length === 1 && factors[0] ? factors[0] : productElement(factors);
