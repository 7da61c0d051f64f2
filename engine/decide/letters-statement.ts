import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import { integerElement } from '../expression/element';
import type { Expression } from '../expression/expression';
import { mapEntries } from '../expression/map-entries';
import type { Condition } from '../expression/statement';
import { isZeroFunction, type LetterFunction } from '../field/letter-function';
import type { LetterRing } from '../field/multivariate';
import { writeLetterFunction } from '../field/write-letter-function';
import { lower } from '../ring/lower';
import type { Term } from '../ring/term';
import type { Monomial } from '../ring/word-ring';
import { minusOneElement } from '../ring/write-word';
import { characteristicOf } from './letters-characteristic';
import { generated, type Generator } from './letters-generators';
import { letterValues } from './letters-values';
import { notAUnit } from './read-unit';

/** Words with entries in letters in kernel form, over an unspecified field. */
export interface LettersStatement {
  readonly characteristic: bigint;
  readonly ring: LetterRing;
  /** The values of the entries that occur, each once; terms name them by their place here. */
  readonly entries: readonly LetterFunction[];
  readonly sides: readonly (readonly Term<number>[])[];
  readonly generators: readonly Generator[];
  readonly monomials: readonly Monomial[];
  /** The letters that are left in the entries once everything has cancelled. */
  readonly letters: readonly string[];
  /** The letters that conditions solve for, with their values. */
  readonly solved: ReadonlyMap<string, LetterFunction>;
  /** The monomial of an entry in the generators. */
  monomial(entry: Element): Monomial;
  /** An expression with every entry replaced by its value. */
  valued(expression: Expression): Expression;
}

/** Reads the entries of expressions as functions in letters, none of them zero. */
export function readStatement(
  expressions: readonly Expression[],
  conditions: readonly Condition[],
  budget: Budget,
): LettersStatement {
  const characteristic = characteristicOf(conditions, budget);
  const { ring, read, solved } = letterValues(expressions, characteristic, conditions, budget);
  const entries: LetterFunction[] = [];
  const places = new Map<string, number>();
  const place = (entry: Element): number => {
    const value = read(entry);
    if (isZeroFunction(value))
      throw notAUnit(entry, characteristic === 0n ? 'every field' : `characteristic ${characteristic}`);
    const name = nameOf(value);
    const known = places.get(name);
    if (known !== undefined) return known;
    places.set(name, entries.length);
    entries.push(value);
    return entries.length - 1;
  };
  const sides = expressions.map((expression) => lower(expression, place));
  const { generators, monomials } = generated(ring, entries);
  const letters = new Set<string>();
  for (const generator of generators)
    if (generator.kind !== 'integer')
      for (const { exponents } of generator.value)
        exponents.forEach((e, i) => {
          if (e !== 0) letters.add(ring.letters[i] ?? 'a');
        });
  const written = (entry: Element): Element => {
    const value = read(entry);
    const { num, den } = value.constant;
    const minus = characteristic === 0n ? -1n : characteristic - 1n;
    if (value.factors.size === 0 && den === 1n && (num === 1n || num === minus))
      return { ...(num === 1n ? integerElement(1n) : minusOneElement), at: entry.at };
    return { ...writeLetterFunction(ring, value), at: entry.at };
  };
  return {
    characteristic,
    ring,
    entries,
    sides,
    generators,
    monomials,
    letters: ring.letters.filter((name) => letters.has(name)),
    solved,
    monomial: (entry) => monomialAt(monomials)(place(entry)),
    valued: (expression) => mapEntries(expression, written),
  };
}

/** The monomials of entries by their places. */
export const monomialAt =
  (monomials: readonly Monomial[]) =>
  (place: number): Monomial => {
    const found = monomials[place];
    if (found === undefined) throw new RangeError('an entry that was not read');
    return found;
  };

/** Equal names for functions that are written alike. */
const nameOf = ({ constant, factors }: LetterFunction): string =>
  `${constant.num}/${constant.den} ${[...factors]
    .map(([key, { exponent }]) => `(${key})^${exponent}`)
    .sort()
    .join(' ')}`;
