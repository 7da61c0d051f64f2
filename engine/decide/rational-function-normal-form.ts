import type { Budget } from '../arith/budget';
import { toInt } from '../arith/int';
import { symbol, type Expression } from '../expression/expression';
import { degree as degreeOf, type Polynomial } from '../field/polynomial';
import { rationals, type Rational } from '../field/rational';
import { writePolynomial } from '../field/write-polynomial';
import type { FunctionEntry } from '../place/function-entry';
import { reductionsAt, reductionsAtInfinity } from '../place/reduced-entry';
import type { Term } from '../ring/term';
import { residueClasses, specialisationClasses } from './function-classes';
import { numberPlaces } from './function-number-classes';
import type { FunctionStatement } from './function-statement';
import { NumberArithmetic } from './number-arithmetic';
import { NumberValue } from './number-value';
import { numberWords, writeWords, type NumberWord } from './number-writing';
import type { NormalizedDegree } from './outcome';
import { prefixed } from './prefixed';
import { writtenOverRationals } from './rational-writing';
import { WrittenDegrees } from './written-degrees';

type Terms = readonly Term<FunctionEntry<Rational>>[];

/**
 * The tower over ℚ(t): α = s_∞(α) + Σ_P [P]·r̃_P, a true equality. The places are taken by decreasing degree, those of one degree by the
 * coefficients of their primitive multiples from the top; written are the constant first and then the places upwards. At places of
 * degree 1 and for the constant the values have canonical forms over ℚ, where no large numbers are in them. At other places r̃_P lifts words over a number field, which are not
 * canonical: the form is not promised to be the same for equal elements.
 * J. Milnor, Invent. Math. 9 (1970), Theorem 2.3 with its proof; F. Morel, LNM 2052, Theorem 3.24 (number from memory).
 */
export function rationalFunctionNormalForm(
  statement: FunctionStatement<Rational>,
  budget: Budget,
): readonly NormalizedDegree[] {
  const written = new WrittenDegrees();
  for (const [degree, word] of tower(statement, budget)) written.put(degree, word);
  const constants = specialisationClasses(statement.sides, reductionsAtInfinity());
  for (const { degree, normalForm } of writtenOverRationals(constants, 0, budget)) written.put(degree, normalForm);
  return written.forms(false);
}

/** The products [P]·r̃_P with their degree, the last place first. */
function* tower(statement: FunctionStatement<Rational>, budget: Budget): Generator<readonly [number, Expression]> {
  const { sight, functions } = statement;
  const queue = [...statement.order()]; // the next place is the last
  const pending = sight.places.map((_, index) => [...statement.terms(0, index)]);
  /** Takes in the places that an entry has brought. */
  const enqueue = (): void => {
    for (let index = pending.length; index < sight.places.length; index += 1) {
      pending.push([]);
      let at = queue.length;
      while (at > 0 && statement.compare(queue[at - 1] ?? 0, index) > 0) at -= 1;
      queue.splice(at, 0, index);
    }
  };
  const entryOf = (f: Polynomial<Rational>): FunctionEntry<Rational> => {
    const entry = sight.entry(
      f.length === 1
        ? { constant: f[0]!, powers: [] }
        : { constant: rationals.one, powers: [{ base: f, exponent: 1 }] },
    );
    enqueue();
    return entry;
  };

  for (let index = queue.pop(); index !== undefined; index = queue.pop()) {
    budget.spend('building the tower of residues');
    const place = sight.places[index]!;
    const prefix = symbol([writePolynomial(rationals, place, functions.generator)]);
    const sides: readonly Terms[] = [pending[index] ?? []];
    if (degreeOf(place) === 1) {
      const classes = residueClasses(sides, reductionsAt(sight.places, index));
      for (const { degree, normalForm } of writtenOverRationals(classes, 0, budget))
        yield [degree + 1, prefixed(prefix, normalForm)];
      continue;
    }
    const classes = numberPlaces(statement, budget).residues(sides, index);
    const arithmetic = new NumberArithmetic(classes.field, classes.generators, budget);
    const value = new NumberValue(classes, arithmetic, sides[0] ?? [], budget);
    for (const own of classes.degrees(sides[0] ?? [])) {
      const words = numberWords(value, own, classes, arithmetic);
      if (words.length === 0) continue;
      yield [own + 1, writeWords(words, (a) => writePolynomial(rationals, a, functions.generator), [prefix])];
      for (const word of words) {
        const term = lifted(word, entryOf(place), entryOf);
        for (const f of [...word.symbols, ...(word.angle === undefined ? [] : [word.angle])]) {
          const { exponents } = entryOf(f);
          for (let i = 0; i < exponents.length; i += 2) {
            const terms = pending[Number(exponents[i])];
            if (terms !== undefined && terms.at(-1) !== term) terms.push(term);
          }
        }
      }
    }
  }
}

/** −[P]·r̃_P for one word of r̃_P. */
function lifted(
  word: NumberWord,
  place: FunctionEntry<Rational>,
  entryOf: (f: Polynomial<Rational>) => FunctionEntry<Rational>,
): Term<FunctionEntry<Rational>> {
  return {
    coefficient: toInt(-word.coefficient),
    eta: word.eta,
    angles: word.angle === undefined ? [] : [entryOf(word.angle)],
    factors: [place, ...word.symbols.map(entryOf)].map((entry) => ({ kind: 'symbol', entry })),
  };
}
