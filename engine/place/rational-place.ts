import { EXACT, bitLength } from '../arith/bits';
import { gcd } from '../arith/gcd';
import { isOddInt, moduloFour, negateInt, toInt, type Int } from '../arith/int';
import { jacobi, smallJacobi } from '../arith/jacobi';
import { inverseModulo, modulo, powerModulo, smallInverse, smallPower } from '../arith/modular';
import { TRIAL_BOUND } from '../arith/small-primes';
import { primeField } from '../field/prime-field';
import type { Rational } from '../field/rational';
import { fieldUnits } from '../ring/field-units';
import type { ResidueClass, UnitGroup } from '../ring/residue-class-ring';
import { isKnownSquare } from './known-square';
import { exponentOf, forEachExponent, type RationalEntry } from './rational-entry';
import type { BaseElement } from './sight';
import type { LocalEntry } from './theta-ring';

/** How entries look at one element of the base: the units of the residue ring, and every entry as πⁿu. */
export interface RationalPlace {
  readonly units: UnitGroup<Int>;
  local(entry: RationalEntry): LocalEntry<Int>;
}

/** Below this a product of two residues is exact as a number. */
const SMALL_PRIME = 1n << 26n;

const MINUS_EXACT = -EXACT;

/** The place of the base element with this index: a prime of ℚ, or all primes that divide an unsplit composite. */
export function rationalPlace(base: readonly BaseElement[], index: number): RationalPlace {
  const element = base[index];
  if (element === undefined) throw new RangeError('no such element of the base');
  if (!element.prime) return unsplitPlace(element.value, index);
  const p = element.value;
  const units = primeUnits(p);
  return { units, local: (entry) => localEntry(entry.value, p, exponentOf(entry, index)) };
}

/** The residues modulo a prime p; they are numbers if p < 2^26. */
export const primeUnits = (p: bigint): UnitGroup<Int> => (p < SMALL_PRIME ? new SmallUnits(Number(p)) : largeUnits(p));

/** A non-zero rational number of known valuation as the prime p sees it. */
export function localEntry(value: Rational, p: bigint, valuation: Int): LocalEntry<Int> {
  const unit = unitModulo(value, p, valuation);
  return { valuation, unit, squareClass: quadraticClass(unit, p) };
}

/** A class rather than closures: one is made for every prime in sight. */
class SmallUnits implements UnitGroup<Int> {
  readonly one = 1;
  readonly minusOne: number;
  readonly classOfMinusOne: 0 | 1;
  readonly orderModFour: 1 | 2 | 3;

  constructor(private readonly p: number) {
    this.minusOne = p - 1;
    this.orderModFour = p === 2 ? 2 : p % 4 === 1 ? 1 : 3;
    this.classOfMinusOne = this.orderModFour === 3 ? 1 : 0;
  }
  multiply(a: Int, b: Int): number {
    return (Number(a) * Number(b)) % this.p;
  }
  power(a: Int, n: Int): Int {
    if (n === 1) return a;
    const base = n < 0 ? smallInverse(Number(a), this.p) : Number(a);
    return n === -1 ? base : smallPower(base, n < 0 ? negateInt(n) : n, this.p);
  }
  equal(a: Int, b: Int): boolean {
    return a === b;
  }
}

function largeUnits(p: bigint): UnitGroup<Int> {
  const units = fieldUnits(primeField(p));
  return {
    ...units,
    one: 1,
    multiply: (a, b) => toInt(units.multiply(BigInt(a), BigInt(b))),
    power: (a, n) => toInt(units.power(BigInt(a), n)),
    equal: (a, b) => a === b,
    minusOne: toInt(units.minusOne),
  };
}

/** 0 for a square modulo the prime p, 1 for a non-square; every unit is a square modulo 2. */
export function quadraticClass(unit: Int, p: bigint): 0 | 1 {
  if (p === 2n) return 0;
  const symbol = typeof unit === 'number' && p < EXACT ? smallJacobi(unit, Number(p)) : jacobi(BigInt(unit), p);
  return symbol === 1 ? 0 : 1;
}

/** The residue modulo b of a / b^valuation, for b prime to what is left. */
export function unitModulo({ num, den }: Rational, b: bigint, valuation: Int): Int {
  if (b < SMALL_PRIME && num < EXACT && num > MINUS_EXACT && den < EXACT)
    return smallUnitModulo(Number(num), Number(den), Number(b), Number(valuation));
  const top = valuation > 0 ? num / b ** BigInt(valuation) : num;
  const bottom = valuation < 0 ? den / b ** -BigInt(valuation) : den;
  if (b < SMALL_PRIME) {
    const p = Number(b);
    const remainder = Number(top % b);
    const residue = remainder < 0 ? remainder + p : remainder;
    return bottom === 1n ? residue : (residue * smallInverse(Number(bottom % b), p)) % p;
  }
  const residue = modulo(top, b);
  return toInt(bottom === 1n ? residue : (residue * inverseModulo(bottom, b)) % b);
}

/** `unitModulo` for numbers below 2^53 and a modulus below 2^26. */
function smallUnitModulo(num: number, den: number, p: number, valuation: number): number {
  for (; valuation > 0; valuation -= 1) num /= p;
  for (; valuation < 0; valuation += 1) den /= p;
  const remainder = num % p;
  const residue = remainder < 0 ? remainder + p : remainder;
  return den === 1 ? residue : (residue * smallInverse(den % p, p)) % p;
}

/**
 * The place at all primes that divide a composite b, none of which is known. Square classes are formal: bit 0 stands for −1 and
 * bit i + 1 for the i-th element of the base, so that a mask of 0 is a square modulo every prime, whichever they are.
 */
function unsplitPlace(b: bigint, index: number): RationalPlace {
  return {
    units: {
      one: 1,
      multiply: (x, y) => toInt((BigInt(x) * BigInt(y)) % b),
      power: (x, n) => toInt(powerModulo(BigInt(x), BigInt(n), b)),
      equal: (x, y) => x === y,
      minusOne: toInt(b - 1n),
      classOfMinusOne: 1,
      orderModFour: undefined,
    },
    local(entry) {
      let mask = entry.negative ? 1n : 0n;
      forEachExponent(entry, (i, e) => {
        if (i !== index && isOddInt(e)) mask |= 1n << BigInt(i + 1);
      });
      const valuation = exponentOf(entry, index);
      return { valuation, unit: unitModulo(entry.value, b, valuation), squareClass: toInt(mask) };
    },
  };
}

/** The product modulo b that a formal square class stands for. */
export function maskedProduct(base: readonly BaseElement[], b: bigint, mask: bigint): bigint {
  let unit = (mask & 1n) === 1n ? b - 1n : 1n;
  base.forEach(({ value }, i) => {
    if (((mask >> BigInt(i + 1)) & 1n) === 1n) unit = (unit * value) % b;
  });
  return unit;
}

export type ZeroTest = 'zero' | 'nonzero' | 'unknown';

/**
 * Whether a residue computed against an unsplit composite b is zero at every prime p dividing b, as far as that can be told
 * without splitting b. b is no perfect power and has no prime factor below 2^12.
 *
 * A class is [b]·x plus what is unramified at every p, x the residue against b; at p with f = v_p(b) its residue is f_ε·x
 * up to the change of uniformizer. So x = 0 gives zero at every p. Conversely it is not zero at some p: in degree 0 if the rank
 * of x is not 0 (the rank at p is f times it); by quadratic reciprocity if the Jacobi symbol of its (signed) discriminant is
 * −1, since then some p with f odd sees a non-square; in negative degree if the rank is odd, for some f is odd; in degree 1 if
 * u^f ≠ 1 modulo every p for every possible f.
 */
export function unsplitZeroTest(
  base: readonly BaseElement[],
  entries: readonly RationalEntry[],
  b: bigint,
  degree: number,
  x: ResidueClass<Int> | undefined,
): ZeroTest {
  if (x === undefined) return 'zero';
  if (x.unit !== undefined) {
    const trialBits = bitLength(BigInt(TRIAL_BOUND)) - 1;
    let power = 1n;
    for (let bits = bitLength(b); bits > 0; bits -= trialBits) {
      power = (power * BigInt(x.unit)) % b;
      if (gcd(power - 1n, b) !== 1n) return 'unknown';
    }
    return 'nonzero';
  }
  if (degree === 0 ? x.rank !== 0 : isOddInt(x.rank)) return 'nonzero';
  const mask = BigInt(x.squareClass) ^ (degree < 0 && moduloFour(x.rank) === 2 ? 1n : 0n);
  if (mask === 0n) return 'zero';
  if (jacobi(maskedProduct(base, b, mask), b) === -1) return 'nonzero';
  return isKnownSquare(base, entries, b, mask) ? 'zero' : 'unknown';
}
