import { toInt, type Int } from '../arith/int';
import type { Span } from '../expression/span';
import type { Rational } from '../field/rational';
import type { Visited } from './theta-ring';

/**
 * A rational entry of a symbol. `exponents` gives its factorisation over the base of the sight it was last put into
 * (`see`): the index of a base element and its exponent, in turn; exponents that are 0 are left out.
 */
export interface RationalEntry extends Visited {
  readonly value: Rational;
  readonly negative: boolean;
  /** Where the entry stands first. */
  readonly at: Span | undefined;
  exponents: readonly Int[];
}

export const rationalEntry = (value: Rational, at?: Span): RationalEntry => ({
  value,
  negative: value.num < 0n,
  at,
  exponents: noExponents,
  visitor: undefined,
  symbolThere: undefined,
  angleThere: undefined,
});

const noExponents: readonly Int[] = [];

/** Calls `visit` for each base element with an exponent in an entry. */
export function forEachExponent({ exponents }: RationalEntry, visit: (index: number, exponent: Int) => void): void {
  for (let i = 0; i < exponents.length; i += 2) visit(Number(exponents[i]), exponents[i + 1] ?? 0);
}

/** The exponents of an entry by the index of the base element. */
export function exponentMap(entry: RationalEntry): ReadonlyMap<number, Int> {
  const map = new Map<number, Int>();
  forEachExponent(entry, (index, exponent) => map.set(index, exponent));
  return map;
}

/** The exponent of the base element with this index in an entry. */
export function exponentOf({ exponents }: RationalEntry, index: number): Int {
  for (let i = 0; i < exponents.length; i += 2) if (exponents[i] === index) return exponents[i + 1] ?? 0;
  return 0;
}

/** Makes entries from rationals, one object for each value. */
export function rationalEntries(): {
  intern(value: Rational, at?: Span): RationalEntry;
  all(): readonly RationalEntry[];
} {
  const all: RationalEntry[] = [];
  const byDenominator = new Map<Int, Map<Int, RationalEntry>>();
  return {
    intern(value, at) {
      let byNumerator = byDenominator.get(toInt(value.den));
      if (byNumerator === undefined) byDenominator.set(toInt(value.den), (byNumerator = new Map()));
      let entry = byNumerator.get(toInt(value.num));
      if (entry === undefined) {
        entry = rationalEntry(value, at);
        byNumerator.set(toInt(value.num), entry);
        all.push(entry);
      }
      return entry;
    },
    all: () => all,
  };
}
