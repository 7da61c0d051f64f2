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
  exponents: ReadonlyMap<number, bigint>;
}

/** Makes entries from rationals, one object for each value. */
export function rationalEntries(): { intern(value: Rational, at?: Span): RationalEntry; all(): readonly RationalEntry[] } {
  const entries = new Map<string, RationalEntry>();
  return {
    intern(value, at) {
      const key = value.den === 1n ? value.num.toString(36) : `${value.num.toString(36)}/${value.den.toString(36)}`;
      let entry = entries.get(key);
      if (entry === undefined) {
        entry = { value, negative: value.num < 0n, at, exponents: new Map() };
        entries.set(key, entry);
      }
      return entry;
    },
    all: () => [...entries.values()],
  };
}
