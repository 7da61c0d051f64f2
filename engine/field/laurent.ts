import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import { Refusal } from '../expression/refusal';
import type { Span } from '../expression/span';
import type { Field } from './field';
import { SIZE_LIMIT, tooLarge } from './read-element';

/** A monomial with its coefficient, which is not zero; exponents by letter, those that are 0 left out. */
export interface LaurentTerm<E> {
  readonly coefficient: E;
  readonly exponents: ReadonlyMap<string, bigint>;
}

/** A Laurent polynomial in letters over a field: its terms by a name of their monomial. Zero has none. */
export type Laurent<E> = ReadonlyMap<string, LaurentTerm<E>>;

/** Polynomials are not multiplied out past this many terms. */
const TERM_LIMIT = 2_000;

/** Arithmetic of Laurent polynomials over a field of coefficients. */
export interface LaurentRing<E> {
  readonly field: Field<E>;
  constant(value: E): Laurent<E>;
  letter(name: string): Laurent<E>;
  add(f: Laurent<E>, g: Laurent<E>): Laurent<E>;
  sum(list: readonly Laurent<E>[]): Laurent<E>;
  negate(f: Laurent<E>): Laurent<E>;
  multiply(f: Laurent<E>, g: Laurent<E>): Laurent<E>;
  /** The inverse of a single term; `undefined` for a polynomial that is no unit of the ring. */
  invert(f: Laurent<E>): Laurent<E> | undefined;
}

export function laurentRing<E>(field: Field<E>, budget: Budget): LaurentRing<E> {
  const put = (terms: Map<string, LaurentTerm<E>>, term: LaurentTerm<E>): void => {
    const key = keyOf(term.exponents);
    const present = terms.get(key);
    const coefficient = present === undefined ? term.coefficient : field.add(present.coefficient, term.coefficient);
    if (field.isZero(coefficient)) terms.delete(key);
    else terms.set(key, { coefficient, exponents: term.exponents });
  };
  const of = (...list: readonly LaurentTerm<E>[]): Laurent<E> => {
    const terms = new Map<string, LaurentTerm<E>>();
    for (const term of list) put(terms, term);
    return terms;
  };
  return {
    field,
    constant: (value) => of({ coefficient: value, exponents: new Map() }),
    letter: (name) => of({ coefficient: field.one, exponents: new Map([[name, 1n]]) }),
    add: (f, g) => of(...f.values(), ...g.values()),
    sum(list) {
      const terms = new Map<string, LaurentTerm<E>>();
      for (const f of list) {
        budget.spend('reading an entry');
        for (const term of f.values()) put(terms, term);
      }
      return terms;
    },
    negate: (f) => of(...[...f.values()].map((term) => ({ ...term, coefficient: field.negate(term.coefficient) }))),
    multiply(f, g) {
      if (f.size * g.size > TERM_LIMIT)
        throw new Refusal(
          'not-yet',
          'An entry has too many terms to multiply out. Entries in letters are decided when they are products of letters.',
        );
      const terms = new Map<string, LaurentTerm<E>>();
      for (const a of f.values()) {
        budget.spend('reading an entry');
        for (const b of g.values()) {
          if ((field.size?.(a.coefficient) ?? 0) + (field.size?.(b.coefficient) ?? 0) > SIZE_LIMIT)
            throw tooLarge(undefined);
          put(terms, {
            coefficient: field.multiply(a.coefficient, b.coefficient),
            exponents: addExponents(a.exponents, b.exponents),
          });
        }
      }
      return terms;
    },
    invert(f) {
      const [term, more] = f.values();
      if (term === undefined || more !== undefined) return undefined;
      const exponents = new Map([...term.exponents].map(([name, e]) => [name, -e] as const));
      return of({ coefficient: field.inverse(term.coefficient), exponents });
    },
  };
}

const keyOf = (exponents: ReadonlyMap<string, bigint>): string =>
  [...exponents]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, e]) => `${name}^${e}`)
    .join('*');

function addExponents(a: ReadonlyMap<string, bigint>, b: ReadonlyMap<string, bigint>): ReadonlyMap<string, bigint> {
  if (a.size === 0) return b;
  const sum = new Map(a);
  for (const [name, e] of b) {
    const next = (sum.get(name) ?? 0n) + e;
    if (next === 0n) sum.delete(name);
    else sum.set(name, next);
  }
  return sum;
}

/**
 * The value of a written element as a Laurent polynomial; `letterValue` gives what a letter stands for. Division is by single
 * terms, or by a polynomial of which the numerator is a multiple by a single term; other quotients are refused as `not-yet`.
 */
export function readLaurent<E>(
  element: Element,
  ring: LaurentRing<E>,
  letterValue: (name: string) => Laurent<E>,
): Laurent<E> {
  const read = (e: Element): Laurent<E> => {
    switch (e.kind) {
      case 'integer': {
        const value = ring.field.fromInteger(e.value);
        return ring.field.isZero(value) ? new Map() : ring.constant(value);
      }
      case 'letter':
        return letterValue(e.name);
      case 'negate':
        return ring.negate(read(e.of));
      case 'sum':
        return ring.sum(e.terms.map(read));
      case 'product':
        return e.factors.map(read).reduce(ring.multiply);
      case 'quotient':
        return divide(read(e.numerator), read(e.denominator), e.denominator.at ?? e.at);
      case 'power':
        return e.exponent < 0
          ? laurentPower(divide(ring.constant(ring.field.one), read(e.base), e.at), BigInt(-e.exponent), ring, e.at)
          : laurentPower(read(e.base), BigInt(e.exponent), ring, e.at);
    }
  };
  const divide = (f: Laurent<E>, g: Laurent<E>, at: Span | undefined): Laurent<E> => {
    if (g.size === 0) throw new Refusal('division-by-zero', 'The denominator is 0. Change it to a unit.', at);
    const inverse = ring.invert(g);
    if (inverse !== undefined) return ring.multiply(f, inverse);
    if (f.size === 0) return f;
    // f = m·g for a single term m, if at all for one with the quotient of two terms
    const [top] = f.values();
    for (const bottom of g.values()) {
      const m = ring.multiply(single(top), ring.invert(single(bottom)) ?? new Map());
      if (ring.add(f, ring.negate(ring.multiply(m, g))).size === 0) return m;
    }
    throw new Refusal(
      'not-yet',
      'Quotients by a sum of letters are not decided yet. Use entries that are products of letters.',
      at,
    );
  };
  const single = (term: LaurentTerm<E> | undefined): Laurent<E> =>
    term === undefined ? new Map() : new Map([[keyOf(term.exponents), term]]);
  return read(element);
}

/**
 * f^n. A single term is raised at once, its coefficient measured before it is computed; a sum is multiplied out for n ≥ 0 only,
 * and refused as `not-yet` when that would be long.
 */
export function laurentPower<E>(f: Laurent<E>, n: bigint, ring: LaurentRing<E>, at?: Span): Laurent<E> {
  const [term, more] = f.values();
  if (n === 0n) return ring.constant(ring.field.one);
  if (term === undefined) return f;
  const size = n < 0n ? -n : n;
  if (more === undefined) {
    const base = n < 0n ? ring.field.inverse(term.coefficient) : term.coefficient;
    if (BigInt((ring.field.size?.(base) ?? 1) - 1) * size > BigInt(SIZE_LIMIT)) throw tooLarge(at);
    const exponents = new Map([...term.exponents].map(([name, e]) => [name, e * n] as const));
    return new Map([[keyOf(exponents), { coefficient: fieldPower(ring.field, base, size), exponents }]]);
  }
  if (n < 0n || n > BigInt(TERM_LIMIT))
    throw new Refusal('not-yet', 'Large or negative powers of a sum of letters are not decided yet.', at);
  let result = f;
  for (let i = 1n; i < n; i += 1n) result = ring.multiply(result, f);
  return result;
}

function fieldPower<E>(field: Field<E>, base: E, exponent: bigint): E {
  if (field.equal(base, field.one)) return base;
  let result = field.one;
  for (const digit of exponent.toString(2)) {
    result = field.multiply(result, result);
    if (digit === '1') result = field.multiply(result, base);
  }
  return result;
}
