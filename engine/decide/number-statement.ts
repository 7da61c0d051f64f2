import type { Budget } from '../arith/budget';
import { addInt, type Int } from '../arith/int';
import type { Expression } from '../expression/expression';
import { primitiveOfRational } from '../field/integer-polynomial';
import type { NumberField, NumberFieldElement } from '../field/number-field';
import { monicRational } from '../field/integer-polynomial';
import { rational } from '../field/rational';
import { forEachExponent, rationalEntries, type RationalEntry } from '../place/rational-entry';
import { see } from '../place/sight';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import { lower } from '../ring/lower';
import { numberMinusOne, type NumberClasses, type NumberUnit } from './number-classes';
import { unitReader } from './read-unit';

/** An entry c·u before its constant c is split; u is monic as a polynomial, `index` numbers it, and −1 stands for u = 1. */
interface Entry extends NumberUnit {
  readonly constant: RationalEntry;
  readonly index: number;
  exponents: readonly Int[];
}

/**
 * Words over a number field as classes. Generators of the units: −1, the primes of the constants in front of monic polynomials, as
 * far as these are split, and the monic polynomials that occur.
 */
export function numberStatement(
  field: NumberField,
  expressions: readonly Expression[],
  budget: Budget,
): NumberClasses<NumberUnit, NumberUnit> {
  const constants = rationalEntries();
  const monics: NumberFieldElement[] = [];
  const indices = new Map<string, number>();
  const entries: Entry[] = [];
  const byValue = new Map<string, Entry>();
  const indexOf = (a: NumberFieldElement): number => {
    if (a.length === 1) return -1;
    const name = a.map(({ num, den }) => `${num}/${den}`).join();
    const known = indices.get(name);
    if (known !== undefined) return known;
    indices.set(name, monics.length);
    return monics.push(a) - 1;
  };
  const read = unitReader(field, budget);
  const sides = expressions.map((side) =>
    lower(side, (element): NumberUnit => {
      const value = read(element);
      const constant = constants.intern(value[value.length - 1]!, element.at);
      const index = indexOf(monicRational(primitiveOfRational(value).primitive));
      const name = `${constant.value.num}/${constant.value.den}|${index}`;
      const known = byValue.get(name);
      if (known !== undefined) return known;
      const made: Entry = { ...numberMinusOne(), constant, index };
      byValue.set(name, made);
      entries.push(made);
      return made;
    }),
  );
  const base = see(constants.all(), 'none', budget);
  for (const entry of entries) {
    const exponents = new Map<number, Int>();
    if (entry.constant.negative) exponents.set(0, 1);
    forEachExponent(entry.constant, (i, e) => void exponents.set(1 + i, addInt(exponents.get(1 + i) ?? 0, e)));
    if (entry.index >= 0) exponents.set(1 + base.length + entry.index, 1);
    entry.exponents = [...exponents].flat();
  }
  return {
    field,
    generators: [[rational(-1n)], ...base.map(({ value }) => [rational(value)]), ...monics],
    sides,
    minusOne: numberMinusOne(),
    image: evaluate,
    degrees: degreesOf,
  };
}
