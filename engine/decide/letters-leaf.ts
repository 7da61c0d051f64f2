import type { Budget } from '../arith/budget';
import { factor } from '../arith/factor';
import { isOddInt, moduloFour, xorInt, type Int } from '../arith/int';
import { valuation } from '../arith/valuation';
import type { Expression } from '../expression/expression';
import { primeField } from '../field/prime-field';
import type { Rational } from '../field/rational';
import { primeResidueField } from '../place/prime-residue-field';
import { localEntry, primeUnits } from '../place/rational-place';
import { evaluate } from '../ring/evaluate';
import { classedUnit, fieldUnits } from '../ring/field-units';
import { lettersRing } from '../ring/letters-ring';
import { residueClassRing, type ResidueClass, type UnitGroup } from '../ring/residue-class-ring';
import { isZeroModEta, isZeroModH, type SignClass } from '../ring/sign-ring';
import { tabledRing } from '../ring/tabled-ring';
import { forEachEntry, type Term } from '../ring/term';
import { countBits, wordRing } from '../ring/word-ring';
import { writeResidueClass } from '../ring/write-residue-class';
import { total, zeroExpression } from '../ring/write-word';
import { writeWord } from './letters-words';

/** A constant times a product of marks, letters that stand for uniformizers; exponents by the place of the mark. */
export interface MarkedConstant {
  readonly constant: Rational;
  readonly marks: readonly bigint[];
}

/** A coefficient of a word in marks that is not zero. */
export interface LeafDifference {
  readonly degree: number;
  /** The degree of the coefficient itself. */
  readonly own: number;
  /** The prime at which a last residue was taken; absent for the signs. */
  readonly prime?: bigint;
  readonly zeroModEta: boolean;
  readonly zeroModH: boolean;
  /** The same coefficient for a part of the terms. */
  value(terms: readonly Term<number>[]): Expression;
}

/** A sum of terms at the end of a chain: every entry is a constant of ℚ, or of 𝔽_p, times marks. */
export interface Leaf {
  readonly characteristic: bigint;
  readonly terms: readonly Term<number>[];
  entryAt(place: number): MarkedConstant;
  readonly markCount: number;
}

/**
 * The coefficients that are not zero, of the words that hold all marks. Marks are independent letters, so a coefficient is zero
 * iff its class in K^MW of the constants is; over ℚ the residues at all primes and the signs see that class (J. Milnor,
 * Introduction to Algebraic K-Theory, §11; J. Milnor, D. Husemoller, Symmetric Bilinear Forms, IV.2; together by the pull-back
 * theorem, F. Morel, Comment. Math. Helv. 79, 2004).
 */
export function leafDifferences(leaf: Leaf, budget: Budget): readonly LeafDifference[] {
  const { characteristic: p } = leaf;
  if (p === 0n) return [...signDifferences(leaf, budget), ...primeDifferences(leaf, budget)];
  const field = primeField(p);
  const units = fieldUnits(field);
  const minusOne = classedUnit(field, field.negate(field.one));
  const ring = tabledRing(lettersRing(residueClassRing(units), minusOne, budget), (place) => {
    const { constant, marks } = leaf.entryAt(place);
    return { unit: classedUnit(field, constant.num), exponents: exponentsOf(marks) };
  });
  const evaluated = (terms: readonly Term<number>[]) => evaluate(terms, ring, budget);
  const write = (degree: number, value: ResidueClass<bigint> | undefined) => writeResidueClass(field, degree, value);
  return residueDifferences(leaf.terms, evaluated, allMarks(leaf.markCount), units, write, {});
}

const allMarks = (count: number): bigint => (1n << BigInt(count)) - 1n;

/** By signs: ℚ^× → ±1 gives the part of K^MW(ℚ) that residues do not see, words in −1 and η. */
function signDifferences({ terms, entryAt, markCount }: Leaf, budget: Budget): readonly LeafDifference[] {
  const ring = tabledRing(wordRing('zero', budget), (place) => {
    const { constant, marks } = entryAt(place);
    return { negative: constant.num < 0n, exponents: exponentsOf(marks) };
  });
  const marks = allMarks(markCount);
  const found: LeafDifference[] = [];
  for (const [degree, words] of evaluate(terms, ring, budget))
    for (const [mask, b] of words) {
      if ((mask & marks) !== marks) continue;
      const own = degree - countBits(mask);
      const write = (value: SignClass | undefined): Expression =>
        value === undefined ? zeroExpression : total(writeWord([], own, 0n, value));
      found.push({
        degree,
        own,
        zeroModEta: isZeroModEta(own, b),
        zeroModH: isZeroModH('zero', own, b),
        value: (part) => write(evaluate(part, ring, budget).get(degree)?.get(mask)),
      });
    }
  return found;
}

/** The residues at the primes of the constants, with one more mark for the prime. */
function primeDifferences({ terms, entryAt, markCount }: Leaf, budget: Budget): readonly LeafDifference[] {
  const primes = new Set<bigint>();
  for (const place of placesOf(terms)) {
    const { num, den } = entryAt(place).constant;
    for (const n of [num, den]) for (const { prime } of factor(n, budget)) primes.add(prime);
  }
  return [...primes]
    .sort((a, b) => (a < b ? -1 : 1))
    .flatMap((p) => {
      const order = ({ num, den }: Rational): number => valuation(num, p).exponent - valuation(den, p).exponent;
      const ramified = terms.filter((term) => [...placesOf([term])].some((at) => order(entryAt(at).constant) !== 0));
      const units = primeUnits(p);
      const minusOne = { unit: units.minusOne, squareClass: units.classOfMinusOne };
      const ring = tabledRing(lettersRing(residueClassRing(units), minusOne, budget), (place) => {
        const { constant, marks } = entryAt(place);
        const { unit, squareClass, valuation: n } = localEntry(constant, p, order(constant));
        return { unit: { unit, squareClass }, exponents: exponentsOf([...marks, BigInt(n)]) };
      });
      const evaluated = (part: readonly Term<number>[]) => evaluate(part, ring, budget);
      const write = (degree: number, value: ResidueClass<Int> | undefined) =>
        writeResidueClass(primeResidueField(p), degree, value);
      return residueDifferences(ramified, evaluated, allMarks(markCount + 1), units, write, { prime: p });
    });
}

function residueDifferences<E>(
  terms: readonly Term<number>[],
  evaluated: (terms: readonly Term<number>[]) => ReadonlyMap<number, ReadonlyMap<bigint, ResidueClass<E>>>,
  marks: bigint,
  units: UnitGroup<E>,
  write: (degree: number, value: ResidueClass<E> | undefined) => Expression,
  at: { readonly prime?: bigint },
): readonly LeafDifference[] {
  const found: LeafDifference[] = [];
  for (const [degree, words] of evaluated(terms))
    for (const [mask, { unit, rank, squareClass }] of words) {
      if ((mask & marks) !== marks) continue;
      const own = degree - countBits(mask);
      // signed discriminant: for rank 2 modulo 4 it is −1 times the determinant
      const twist = unit === undefined && moduloFour(rank) === 2 ? units.classOfMinusOne : 0;
      found.push({
        degree,
        own,
        ...at,
        zeroModEta: unit === undefined && (own < 0 || rank === 0),
        zeroModH: !isOddInt(rank) && xorInt(squareClass, twist) === 0,
        value: (part) => write(own, evaluated(part).get(degree)?.get(mask)),
      });
    }
  return found;
}

/** The places of the entries that occur in terms. */
export function placesOf(terms: readonly Term<number>[]): ReadonlySet<number> {
  const places = new Set<number>();
  for (const term of terms) forEachEntry(term, (place) => void places.add(place));
  return places;
}

const exponentsOf = (marks: readonly bigint[]): ReadonlyMap<number, bigint> =>
  new Map(marks.flatMap((e, i) => (e === 0n ? [] : [[i, e] as const])));
