import type { Budget } from '../arith/budget';
import { addInt, multiplyInt, negateInt, type Int } from '../arith/int';
import { numberField, type NumberFieldElement } from '../field/number-field';
import { remainderPolynomial } from '../field/polynomial';
import { rational, rationals, type Rational } from '../field/rational';
import type { FunctionEntry } from '../place/function-entry';
import { residueLetter } from '../place/function-place';
import { forEachExponent, rationalEntries } from '../place/rational-entry';
import { see } from '../place/sight';
import { thetaRingOver, type ThetaPair, type Valued } from '../place/theta-ring';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import type { Graded } from '../ring/graded-ring';
import type { ResidueRing } from '../ring/residue-ring';
import type { Term } from '../ring/term';
import type { FunctionStatement } from './function-statement';
import { numberMinusOne, type NumberClasses, type NumberUnit } from './number-classes';

type Terms = readonly Term<FunctionEntry<Rational>>[];

/** An entry f = πⁿu at a place of degree ≥ 2, with u as a product of generators. */
export interface ReducedUnit extends NumberUnit, Valued {}

/** What residues at places of degree ≥ 2 of one statement have in common. */
export interface NumberPlaces {
  /** The residues of sides at the place with this index; with uniformizer w·P where w is the unit part of `parameter`. */
  residues(
    sides: readonly Terms[],
    index: number,
    parameter?: FunctionEntry<Rational>,
  ): NumberClasses<FunctionEntry<Rational>, ReducedUnit>;
  /** The specialisations. */
  specialisations(
    sides: readonly Terms[],
    index: number,
    parameter?: FunctionEntry<Rational>,
  ): NumberClasses<FunctionEntry<Rational>, ReducedUnit>;
}

/**
 * The places of degree ≥ 2. Generators of the units that occur there: −1, the primes of the leading coefficients as far as these are
 * split, and the other polynomials in sight, reduced.
 */
export function numberPlaces({ sight, functions }: FunctionStatement<Rational>, budget: Budget): NumberPlaces {
  const letter = residueLetter(functions.base);
  const leads = rationalEntries();
  for (const { lead } of sight.entries) leads.intern(lead);
  const seen = new Set(leads.all());
  const base = see([...seen], 'none', budget);

  /** What an entry is made of, without the place itself: −1 as −1, primes of constants, other places after these. */
  const exponentsAt = (entry: FunctionEntry<Rational>, index: number): readonly (readonly [number, Int])[] => {
    const lead = leads.intern(entry.lead);
    if (!seen.has(lead)) throw new RangeError('an entry that was read later');
    const found: (readonly [number, Int])[] = lead.negative ? [[-1, 1]] : [];
    forEachExponent(lead, (i, e) => void found.push([i, e]));
    for (let i = 0; i < entry.exponents.length; i += 2) {
      const place = Number(entry.exponents[i]);
      if (place !== index) found.push([base.length + place, entry.exponents[i + 1] ?? 0]);
    }
    return found;
  };

  const classes = (
    sides: readonly Terms[],
    index: number,
    parameter: FunctionEntry<Rational> | undefined,
    part: <H>(value: ThetaPair<H>) => H | undefined,
    shift: number,
  ): NumberClasses<FunctionEntry<Rational>, ReducedUnit> => {
    const place = sight.places[index]!;
    const field = numberField(letter, place);
    const units = new Map<FunctionEntry<Rational>, ReducedUnit>();
    // generators are numbered as they are met, −1 first
    const generators: NumberFieldElement[] = [[rational(-1n)]];
    const numbers = new Map([[-1, 0]]);
    const number = (i: number): number => {
      const known = numbers.get(i);
      if (known !== undefined) return known;
      const constantPrime = base[i];
      numbers.set(i, generators.length);
      return (
        generators.push(
          constantPrime === undefined
            ? remainderPolynomial(rationals, sight.places[i - base.length]!, place)
            : [rational(constantPrime.value)],
        ) - 1
      );
    };
    const against = parameter === undefined ? [] : exponentsAt(parameter, index);
    const unit = (entry: FunctionEntry<Rational>): ReducedUnit => {
      const known = units.get(entry);
      if (known !== undefined) return known;
      let valuation: Int = 0;
      for (let i = 0; i < entry.exponents.length; i += 2)
        if (entry.exponents[i] === index) valuation = entry.exponents[i + 1] ?? 0;
      const exponents = new Map<number, Int>();
      const put = (i: number, e: Int): void => {
        const at = number(i);
        exponents.set(at, addInt(exponents.get(at) ?? 0, e));
      };
      for (const [i, e] of exponentsAt(entry, index)) put(i, e);
      for (const [i, e] of against) put(i, multiplyInt(negateInt(valuation), e));
      const made: ReducedUnit = {
        ...numberMinusOne(),
        valuation,
        exponents: [...exponents].filter(([, e]) => e !== 0).flat(),
      };
      units.set(entry, made);
      return made;
    };
    return {
      field,
      generators,
      sides,
      minusOne: { ...numberMinusOne(), valuation: 0 },
      image<H>(terms: Terms, ring: ResidueRing<ReducedUnit, H>, spent: Budget): Graded<H> {
        const values: Graded<H> = new Map();
        for (const [degree, value] of evaluate(
          terms,
          thetaRingOver<FunctionEntry<Rational>, ReducedUnit, H>(ring, unit),
          spent,
        )) {
          const found = part(value);
          if (found !== undefined) values.set(degree - shift, found);
        }
        return values;
      },
      degrees: (terms) => degreesOf(terms).map((degree) => degree - shift),
    };
  };
  return {
    residues: (sides, index, parameter) => classes(sides, index, parameter, (value) => value.d, 1),
    specialisations: (sides, index, parameter) => classes(sides, index, parameter, (value) => value.s, 0),
  };
}
