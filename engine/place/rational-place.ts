import { gcd } from '../arith/gcd';
import { bitLength } from '../arith/bits';
import { jacobi } from '../arith/jacobi';
import { inverseModulo, modulo, powerModulo } from '../arith/modular';
import { TRIAL_BOUND } from '../arith/small-primes';
import { primeField } from '../field/prime-field';
import type { Rational } from '../field/rational';
import { fieldUnits } from '../ring/field-units';
import type { ResidueClass, UnitGroup } from '../ring/residue-class-ring';
import type { RationalEntry } from './rational-entry';
import type { BaseElement } from './sight';
import type { LocalEntry } from './theta-ring';

/** How entries look at one element of the base: the units of the residue ring, and every entry as πⁿu. */
export interface RationalPlace {
  readonly units: UnitGroup<bigint>;
  local(entry: RationalEntry): LocalEntry<bigint>;
}

/** The place of the base element with this index: a prime of ℚ, or all primes that divide an unsplit composite. */
export function rationalPlace(base: readonly BaseElement[], index: number): RationalPlace {
  const element = base[index];
  if (element === undefined) throw new RangeError('no such element of the base');
  const b = element.value;
  const units = element.prime ? fieldUnits(primeField(b)) : unsplitUnits(b);
  return {
    units,
    local(entry) {
      const valuation = entry.exponents.get(index) ?? 0n;
      const unit = unitModulo(entry.value, b, valuation);
      const squareClass = element.prime ? quadraticClass(unit, b) : formalClass(entry, index);
      return { valuation, unit, squareClass };
    },
  };
}

/** 0 for a square modulo the prime p, 1 for a non-square; every unit is a square modulo 2. */
export const quadraticClass = (unit: bigint, p: bigint): bigint => (p === 2n || jacobi(unit, p) === 1 ? 0n : 1n);

/** The residue modulo b of a / b^valuation, for b prime to what is left. */
export function unitModulo({ num, den }: Rational, b: bigint, valuation: bigint): bigint {
  const top = valuation > 0n ? num / b ** valuation : num;
  const bottom = valuation < 0n ? den / b ** -valuation : den;
  const residue = modulo(top, b);
  return bottom === 1n ? residue : (residue * inverseModulo(bottom, b)) % b;
}

/**
 * The units modulo a composite b whose primes are not known. Square classes are formal: bit 0 stands for −1 and bit i + 1 for
 * the i-th element of the base, so that a mask of 0 is a square modulo every prime, whichever they are.
 */
function unsplitUnits(b: bigint): UnitGroup<bigint> {
  return {
    one: 1n,
    multiply: (x, y) => (x * y) % b,
    power: (x, n) => powerModulo(x, n, b),
    equal: (x, y) => x === y,
    minusOne: b - 1n,
    classOfMinusOne: 1n,
    orderModFour: undefined,
  };
}

function formalClass(entry: RationalEntry, index: number): bigint {
  let mask = entry.negative ? 1n : 0n;
  for (const [i, e] of entry.exponents) if (i !== index && (e & 1n) === 1n) mask |= 1n << BigInt(i + 1);
  return mask;
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
  b: bigint,
  degree: number,
  x: ResidueClass<bigint> | undefined,
): ZeroTest {
  if (x === undefined) return 'zero';
  if (x.unit !== undefined) {
    const trialBits = bitLength(BigInt(TRIAL_BOUND)) - 1;
    let power = 1n;
    for (let bits = bitLength(b); bits > 0; bits -= trialBits) {
      power = (power * x.unit) % b;
      if (gcd(power - 1n, b) !== 1n) return 'unknown';
    }
    return 'nonzero';
  }
  if (degree === 0 ? x.rank !== 0n : (x.rank & 1n) === 1n) return 'nonzero';
  const mask = degree < 0 && (x.rank & 2n) === 2n ? x.squareClass ^ 1n : x.squareClass;
  if (mask === 0n) return 'zero';
  let unit = (mask & 1n) === 1n ? b - 1n : 1n;
  base.forEach(({ value }, i) => {
    if (((mask >> BigInt(i + 1)) & 1n) === 1n) unit = (unit * value) % b;
  });
  return jacobi(unit, b) === -1 ? 'nonzero' : 'unknown';
}
