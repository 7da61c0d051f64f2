import { addInt, multiplyInt, type Int } from '../arith/int';
import type { Span } from '../expression/span';
import type { FactoredFunction } from '../field/factored-function';
import type { Field } from '../field/field';
import { degree, monic, type Polynomial } from '../field/polynomial';
import { SIZE_LIMIT, tooLarge } from '../field/read-element';
import { unitPower } from './unit-power';
import type { Visited } from './theta-ring';

/**
 * An entry of a symbol in k(t): lead · ∏ Pᵉ, the P monic and irreducible. `exponents` gives the index of P among the places of the
 * sight and its exponent e, in turn; exponents that are 0 are left out.
 */
export interface FunctionEntry<E> extends Visited {
  /** The leading coefficient. */
  readonly lead: E;
  /** Degree of the numerator less that of the denominator. */
  readonly degree: Int;
  readonly exponents: readonly Int[];
  /** Where the entry stands first. */
  readonly at: Span | undefined;
}

/** A monic irreducible polynomial with its exponent in another one. */
export interface Prime<E> {
  readonly factor: Polynomial<E>;
  readonly exponent: number;
}

/** The places at which the entries of a statement have zeros and poles, and the entries, one object for each value. */
export interface FunctionSight<E> {
  /** Monic irreducible polynomials in the order in which they were met. */
  readonly places: readonly Polynomial<E>[];
  readonly entries: readonly FunctionEntry<E>[];
  /** The entry with this value, which is not 0. Its factors become places. */
  entry(value: FactoredFunction<E>, at?: Span): FunctionEntry<E>;
  /** The index of a monic irreducible polynomial, which becomes a place. */
  index(place: Polynomial<E>): number;
}

/** `factor` takes monic polynomials of degree ≥ 1 apart, each once; it is told where the polynomial is written. */
export function functionSight<E>(
  base: Field<E>,
  nameOf: (c: E) => string,
  factor: (f: Polynomial<E>, at: Span | undefined) => readonly Prime<E>[],
): FunctionSight<E> {
  const places: Polynomial<E>[] = [];
  const entries: FunctionEntry<E>[] = [];
  const indices = new Map<string, number>();
  const factored = new Map<string, readonly (readonly [index: number, exponent: number])[]>();
  const byValue = new Map<string, FunctionEntry<E>>();
  const nameOfPolynomial = (f: Polynomial<E>): string => f.map(nameOf).join();

  const index = (place: Polynomial<E>): number => {
    const name = nameOfPolynomial(place);
    const known = indices.get(name);
    if (known !== undefined) return known;
    indices.set(name, places.length);
    return places.push(place) - 1;
  };
  const primesOf = (f: Polynomial<E>, at: Span | undefined): readonly (readonly [number, number])[] => {
    const name = nameOfPolynomial(f);
    const known = factored.get(name);
    if (known !== undefined) return known;
    const primes = degree(f) === 1 ? [{ factor: f, exponent: 1 }] : factor(f, at);
    const found = primes.map((prime) => [index(prime.factor), prime.exponent] as const);
    factored.set(name, found);
    return found;
  };

  return {
    places,
    entries,
    index,
    entry({ constant, powers }, at) {
      let lead = constant;
      const exponents = new Map<number, Int>();
      let total: Int = 0;
      for (const { base: f, exponent } of powers) {
        const top = f[f.length - 1]!;
        if (!base.equal(top, base.one)) {
          const size = base.size?.(top) ?? 0;
          if (multiplyInt(exponent < 0 ? -exponent : exponent, size - 1) > SIZE_LIMIT) throw tooLarge(at);
          lead = base.multiply(lead, unitPower(base, top, exponent));
        }
        if ((base.size?.(lead) ?? 0) > SIZE_LIMIT) throw tooLarge(at);
        total = addInt(total, multiplyInt(exponent, degree(f)));
        for (const [i, e] of primesOf(monic(base, f), at))
          exponents.set(i, addInt(exponents.get(i) ?? 0, multiplyInt(exponent, e)));
      }
      const sorted = [...exponents].filter(([, e]) => e !== 0).sort(([a], [b]) => a - b);
      const name = `${nameOf(lead)}|${sorted.join()}`;
      const known = byValue.get(name);
      if (known !== undefined) return known;
      const made: FunctionEntry<E> = {
        lead,
        degree: total,
        exponents: sorted.flat(),
        at,
        visitor: undefined,
        symbolThere: undefined,
        angleThere: undefined,
      };
      byValue.set(name, made);
      entries.push(made);
      return made;
    },
  };
}
