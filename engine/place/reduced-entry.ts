import { addInt, multiplyInt, negateInt, type Int } from '../arith/int';
import type { Polynomial } from '../field/polynomial';
import { valueAt } from '../field/polynomial';
import { rationals, type Rational } from '../field/rational';
import { SIZE_LIMIT, tooLarge } from '../field/read-element';
import type { FunctionEntry } from './function-entry';
import { rationalEntries, rationalEntry, type RationalEntry } from './rational-entry';
import type { Visited } from './theta-ring';
import { unitPower } from './unit-power';

/** An entry f = πⁿu of ℚ(t) at a place with residue field ℚ: n, and the rational number that u reduces to. */
export interface ReducedEntry extends Visited {
  readonly valuation: Int;
  readonly rational: RationalEntry;
}

/** The entries of a statement as one place with residue field ℚ sees them. */
export interface Reductions {
  at(entry: FunctionEntry<Rational>): ReducedEntry;
  /** All rational numbers that were met so far. */
  met(): readonly RationalEntry[];
}

export const reducedEntry = (valuation: Int, rational: RationalEntry): ReducedEntry => ({
  valuation,
  rational,
  visitor: undefined,
  symbolThere: undefined,
  angleThere: undefined,
});

/** −1, a unit everywhere. */
export const reducedMinusOne = (): ReducedEntry => reducedEntry(0, rationalEntry({ num: -1n, den: 1n }));

/** At t − a, the one with this index among the places, with uniformizer w·(t − a) where `parameter` gives w; 1 by default. */
export function reductionsAt(
  places: readonly Polynomial<Rational>[],
  index: number,
  parameter: Rational = rationals.one,
): Reductions {
  const place = places[index];
  if (place?.length !== 2) throw new RangeError('no place of degree 1');
  const root = rationals.negate(place[0]!);
  const values = new Map<number, Rational>();
  const valueOf = (i: number): Rational => {
    const value = values.get(i) ?? valueAt(rationals, places[i]!, root);
    values.set(i, value);
    return value;
  };
  return reductions(({ lead, exponents, at }) => {
    let valuation: Int = 0;
    const powers: [Rational, Int][] = [[lead, 1]];
    for (let i = 0; i < exponents.length; i += 2) {
      const [j, e] = [Number(exponents[i]), exponents[i + 1] ?? 0];
      if (j === index) valuation = e;
      else powers.push([valueOf(j), e]);
    }
    powers.push([parameter, negateInt(valuation)]);
    return [valuation, productOf(powers, at)];
  });
}

/** At infinity, with uniformizer w/t: the unit part of an entry reduces to its leading coefficient. */
export const reductionsAtInfinity = (parameter: Rational = rationals.one): Reductions =>
  reductions(({ lead, degree, at }) => [
    negateInt(degree),
    productOf(
      [
        [lead, 1],
        [parameter, degree],
      ],
      at,
    ),
  ]);

function reductions(unitPart: (entry: FunctionEntry<Rational>) => readonly [Int, Rational]): Reductions {
  const numbers = rationalEntries();
  const seen = new Map<FunctionEntry<Rational>, ReducedEntry>();
  return {
    at(entry) {
      const known = seen.get(entry);
      if (known !== undefined) return known;
      const [valuation, value] = unitPart(entry);
      const made = reducedEntry(valuation, numbers.intern(value, entry.at));
      seen.set(entry, made);
      return made;
    },
    met: numbers.all,
  };
}

/** A product of powers of rational numbers, refused when it has more than 10⁵ digits. */
function productOf(powers: readonly (readonly [Rational, Int])[], at: FunctionEntry<Rational>['at']): Rational {
  let bits: Int = 0;
  for (const [value, e] of powers)
    bits = addInt(bits, multiplyInt(e < 0 ? negateInt(e) : e, (rationals.size?.(value) ?? 0) - 1));
  if (bits > SIZE_LIMIT) throw tooLarge(at);
  return powers.reduce(
    (product, [value, e]) => (e === 0 ? product : rationals.multiply(product, unitPower(rationals, value, e))),
    rationals.one,
  );
}
