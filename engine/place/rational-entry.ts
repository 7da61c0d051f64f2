import { toInt, type Int } from '../arith/int';
import type { Span } from '../expression/span';
import type { Rational } from '../field/rational';

/**
 * A rational entry of a symbol. `exponents` gives its factorisation over the base of the sight it was last put into
 * (`see`), by the index of the base element; exponents that are 0 are left out.
 */
export interface RationalEntry {
  readonly value: Rational;
  readonly negative: boolean;
  /** Where the entry stands first. */
  readonly at: Span | undefined;
  exponents: ReadonlyMap<number, Int>;
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
        entry = { value, negative: value.num < 0n, at, exponents: new Map() };
        byNumerator.set(toInt(value.num), entry);
        all.push(entry);
      }
      return entry;
    },
    all: () => all,
  };
}
