import type { Budget } from '../arith/budget';
import {
  integerElement,
  letterElement,
  negateElement,
  powerElement,
  productElement,
  quotientElement,
  sumElement,
  type Element,
} from '../expression/element';
import { randomBetween, seeded } from '../arith/seeded';
import type { FieldName } from '../expression/field-name';
import type { Field } from '../field/field';
import { finiteField, primePower } from '../field/finite';
import { isZeroFunction, polynomialFunction } from '../field/letter-function';
import { letterPower, type LetterRing } from '../field/multivariate';
import { rationals } from '../field/rational';
import { elementReader } from '../field/read-element';
import { readLetterFunction } from '../field/read-letter-function';
import { writeLetterFunction } from '../field/write-letter-function';

/** Values for letters. */
export type Assignment = ReadonlyMap<string, Element>;

/** A field that letters are given values in. */
export interface Target {
  readonly name: FieldName;
  /** Values for so many letters, simple ones first. */
  assignments(letters: readonly string[]): Iterable<Assignment>;
  /** The element as the field writes it, `zero` for 0. Refuses what `readElement` refuses. */
  value(element: Element): Element | 'zero';
}

const number = (n: number): Element => (n < 0 ? negateElement(integerElement(BigInt(-n))) : integerElement(BigInt(n)));

const t = letterElement('t');
const one = integerElement(1n);

const RATIONAL_VALUES: readonly Element[] = [
  ...[2, -1, 3, -2, -3, 5, 4, 1, -5, 7, -4, 6, -7].map(number),
  quotientElement(one, number(2)),
  negateElement(quotientElement(one, number(2))),
];

const FUNCTION_VALUES: readonly Element[] = [
  t,
  number(2),
  negateElement(t),
  number(-1),
  sumElement([t, one]),
  sumElement([one, negateElement(t)]),
  sumElement([powerElement(t, 2), one]),
  sumElement([powerElement(t, 2), t, one]),
  number(3),
  powerElement(t, 2),
  sumElement([t, number(2)]),
  productElement([number(2), t]),
  number(-2),
];

const FINITE_ORDERS = [2, 3, 4, 5, 7, 8, 9, 11, 13] as const;

/** In a given characteristic p finite fields 𝔽_q with more elements are left out, but for 𝔽_p. */
const LARGEST_EXTENSION = 130n;

/** How many values are tried in each kind of field. */
const FINITE_ASSIGNMENTS = 12;
const RATIONAL_ASSIGNMENTS = 60;
const FIRST_ASSIGNMENTS = 16;
const FUNCTION_ASSIGNMENTS = 36;

/** The fields of this characteristic and kind that letters get values in: `excluded` says which characteristics are ruled out. */
export function concreteTargets(
  characteristic: bigint,
  excluded: ReadonlySet<bigint>,
  patience: number,
  budget: Budget,
): readonly Target[] {
  const orders =
    characteristic === 0n
      ? FINITE_ORDERS.map(BigInt)
      : [1n, 2n, 3n, 4n].map((d) => characteristic ** d).filter((q, i) => i === 0 || q <= LARGEST_EXTENSION);
  const finite = orders
    .filter((q) => !excluded.has(primePower(q, budget)?.prime ?? q))
    .map((q) => finiteTarget(q, FINITE_ASSIGNMENTS * patience, budget));
  const primes = (characteristic === 0n ? [3n, 5n] : [characteristic]).filter((p) => !excluded.has(p));
  const functions = primes.map((p) => functionTarget(p, FUNCTION_ASSIGNMENTS * patience, budget));
  if (characteristic !== 0n) return [...finite, ...functions];
  return [
    ...finite,
    rationalTarget(RATIONAL_ASSIGNMENTS * patience, budget),
    functionTarget(0n, FUNCTION_ASSIGNMENTS * patience, budget),
    ...functions,
  ];
}

function finiteTarget(order: bigint, limit: number, budget: Budget): Target {
  const field = finiteField(order, 'z', budget);
  const count = order > 64n ? 64 : Number(order);
  const units = Array.from({ length: count - 1 }, (_, i) => field.write(field.element(BigInt(i + 1))));
  // 1 comes last: with it most words vanish
  return fieldTarget({ kind: 'finite', order }, field, [...units.slice(1), ...units.slice(0, 1)], limit, budget);
}

/** Small values first, then different primes with all signs, which have little in common by chance, then fractions of all signs and sizes. */
function rationalTarget(limit: number, budget: Budget): Target {
  const target = fieldTarget({ kind: 'rationals' }, rationals, RATIONAL_VALUES, limit, budget);
  return {
    ...target,
    *assignments(letters) {
      const few = letters.length < 2 ? limit : FIRST_ASSIGNMENTS;
      yield* tuples(letters, RATIONAL_VALUES, few, () => true);
      if (letters.length < 2) return;
      yield* independentTuples(letters, limit >> 2);
      yield* seededTuples(letters, limit >> 1);
    },
  };
}

/** Fractions of small size, from a fixed stream. */
function* seededTuples(letters: readonly string[], limit: number): Generator<Assignment> {
  const stream = seeded(letters.length);
  const draw = (low: bigint, high: bigint): number => Number(randomBetween(low, high, stream));
  for (let i = 0; i < limit; i += 1)
    yield new Map(
      letters.map((name) => {
        const size = quotientElement(number(draw(1n, 12n)), number(draw(1n, 6n)));
        return [name, draw(0n, 1n) === 0 ? size : negateElement(size)];
      }),
    );
}

/** t for one letter and different primes for the others: in degree 3 little is true of these by chance. */
function* besideLetter(letters: readonly string[]): Generator<Assignment> {
  for (const shift of [1, 3, 4])
    for (const free of letters)
      yield new Map(
        letters.map((name, k) => [name, name === free ? t : number(PRIMES[(k + shift) % PRIMES.length] ?? 2)]),
      );
}

const PRIMES = [2, 3, 5, 7, 11, 13, 17, 19, 23, 29] as const;

/** Values ±2, ±3, ±5, … for the letters, every sign in turn. */
function* independentTuples(letters: readonly string[], limit: number): Generator<Assignment> {
  if (letters.length > PRIMES.length) return;
  for (let i = 0; i < limit && i < 1 << letters.length; i += 1)
    yield new Map(letters.map((name, k) => [name, number(((i >> k) & 1 ? -1 : 1) * (PRIMES[k] ?? 1))]));
}

function fieldTarget<E>(
  name: FieldName,
  field: Field<E>,
  values: readonly Element[],
  limit: number,
  budget: Budget,
): Target {
  const read = elementReader(field, budget);
  return {
    name,
    assignments: (letters) => tuples(letters, values, limit, () => true),
    value(element) {
      const value = read(element);
      return field.isZero(value) ? 'zero' : field.write(value);
    },
  };
}

function functionTarget(characteristic: bigint, limit: number, budget: Budget): Target {
  const base: FieldName = characteristic === 0n ? { kind: 'rationals' } : { kind: 'finite', order: characteristic };
  const value = valueOver({ letters: ['t'], characteristic, budget });
  return {
    name: { kind: 'functions', base, letter: 't' },
    // a value without t alone is one in a smaller field
    *assignments(letters) {
      const moving = (chosen: readonly Element[]): boolean => chosen.some((element) => element.kind !== 'integer');
      const several = characteristic === 0n && letters.length > 1;
      if (several) {
        yield* tuples(letters, FUNCTION_VALUES, 4, moving);
        yield* besideLetter(letters);
      }
      yield* tuples(letters, FUNCTION_VALUES, several ? limit - 4 : limit, moving);
    },
    value,
  };
}

/** Elements of a field of rational functions as they are written. */
export function valueOver(ring: LetterRing): (element: Element) => Element | 'zero' {
  const letter = (name: string) => {
    const place = ring.letters.indexOf(name);
    if (place < 0) throw new RangeError('a letter without a value');
    return polynomialFunction(ring, letterPower(ring, place));
  };
  return (element) => {
    const value = readLetterFunction(element, ring, letter);
    return isZeroFunction(value) ? 'zero' : writeLetterFunction(ring, value);
  };
}

/** Tuples of values, those from the front of the list first; at most `limit` that are wanted. */
export function* tuples(
  letters: readonly string[],
  values: readonly Element[],
  limit: number,
  wanted: (chosen: readonly Element[]) => boolean,
): Generator<Assignment> {
  let left = limit;
  const most = (values.length - 1) * letters.length;
  for (let weight = 0; weight <= most && left > 0; weight += 1)
    for (const places of ofWeight(letters.length, weight, values.length - 1)) {
      const chosen = places.flatMap((place) => values[place] ?? []);
      if (chosen.length !== letters.length || !wanted(chosen)) continue;
      yield new Map(letters.map((name, i) => [name, chosen[i] ?? one]));
      left -= 1;
      if (left <= 0) return;
    }
}

/** The tuples of integers 0 … highest of a length and a sum. */
function* ofWeight(length: number, weight: number, highest: number): Generator<readonly number[]> {
  if (length === 0) {
    if (weight === 0) yield [];
    return;
  }
  for (let first = Math.min(weight, highest); first >= 0; first -= 1)
    for (const rest of ofWeight(length - 1, weight - first, highest)) yield [first, ...rest];
}
