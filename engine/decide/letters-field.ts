import type { Budget } from '../arith/budget';
import { canonicalRules } from '../derive/canonical-rules';
import { derivation } from '../derive/derivation';
import { compareCanonicalWords, factoredAtoms, type FactoredAtom } from '../derive/factored-atoms';
import { letterElement } from '../expression/element';
import type { Expression } from '../expression/expression';
import type { FieldName } from '../expression/field-name';
import type { Condition } from '../expression/statement';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import { characteristicClass } from '../ring/sign-ring';
import { wordRing, type Words } from '../ring/word-ring';
import { total } from '../ring/write-word';
import type { DecidableField } from './decidable-field';
import { sideConditionsOf } from './letters-conditions';
import { constantForm } from './letters-constant';
import { characteristicOf, lettersReader, type LetterEntry } from './letters-reading';
import { readStatement } from './letters-statement';
import { wordFindings, writeWord, writeWords } from './letters-words';
import type { NormalizedDegree } from './outcome';

const THEOREM =
  'Canonical words in independent letters are a basis, over every field at once: residues along each letter in turn are split exact ' +
  '(F. Morel, A¹-Algebraic Topology over a Field, LNM 2052, Theorem 3.24, number from memory).';

/**
 * `any`: an unspecified field whose units are the letters. An equality holds for every field and all values for which its entries
 * are units iff it holds over ℚ(letters), for values are reached by specialisation along a regular local ring of ℤ[letters]
 * (F. Morel, LNM 2052, ch. 3); under `char = p` iff it holds over 𝔽_p(letters). Entries that are ± products of letters are decided by
 * canonical words; without letters the field is ℚ or 𝔽_p, which `concrete` gives. Other entries are refused as `not-yet`.
 */
export function lettersField(concrete: (name: FieldName, budget: Budget) => DecidableField): DecidableField {
  const open = (expressions: readonly Expression[], conditions: readonly Condition[], budget: Budget) => {
    const characteristic = characteristicOf(conditions, budget);
    return { characteristic, ...readStatement(expressions, characteristic, conditions, budget) };
  };
  /** The canonical form of an expression without letters: that over ℚ, or that over 𝔽_p as it stands among letters. */
  const constantForms = (
    characteristic: bigint,
    expression: Expression,
    budget: Budget,
  ): readonly NormalizedDegree[] => {
    const parts = constants(characteristic, budget).normalForm(expression, [], budget);
    if (characteristic === 0n) return parts;
    return parts.map((part) => ({ ...part, normalForm: constantForm(part.normalForm, characteristic) }));
  };
  /** The part without letters is written as it is when it stands alone, so that it has one form whatever else is in sight. */
  const withConstant = (
    statement: ReturnType<typeof open>,
    degree: number,
    words: Words,
    budget: Budget,
  ): Expression => {
    const constant = words.get(0n);
    if (statement.characteristic === 0n || constant === undefined) return writeWords(statement.letters, degree, words);
    const rest = new Map([...words].filter(([mask]) => mask !== 0n));
    const written = constantForms(statement.characteristic, total(writeWord([], degree, 0n, constant)), budget);
    return total([...written.map(({ normalForm }) => normalForm), writeWords(statement.letters, degree, rest)]);
  };
  const constants = (characteristic: bigint, budget: Budget): DecidableField =>
    concrete(characteristic === 0n ? { kind: 'rationals' } : { kind: 'finite', order: characteristic }, budget);

  return {
    name: 'any',
    tex: 'F',
    decide(left, right, conditions, budget) {
      const statement = open([left, right], conditions, budget);
      if (statement.letters.length === 0) {
        const [l, r] = [statement.constant(left), statement.constant(right)];
        const decision = constants(statement.characteristic, budget).decide(l, r, [], budget);
        const over = statement.characteristic === 0n ? 'Q' : `F_${statement.characteristic}`;
        return {
          ...decision,
          theorem: `It holds over every such field iff it holds over ${over}. ${decision.theorem}`,
        };
      }
      const char = characteristicClass(statement.characteristic);
      const ring = wordRing(char, budget);
      const [l = [], r = []] = statement.sides;
      const [lv, rv] = [evaluate(l, ring, budget), evaluate(r, ring, budget)];
      const findings = degreesOf([...l, ...r]).flatMap((degree) =>
        wordFindings(char, statement.letters, degree, lv.get(degree), rv.get(degree)),
      );
      return { findings, theorem: THEOREM };
    },
    normalForm(expression, conditions, budget) {
      const statement = open([expression], conditions, budget);
      if (statement.letters.length === 0)
        return constantForms(statement.characteristic, statement.constant(expression), budget);
      const ring = wordRing(characteristicClass(statement.characteristic), budget);
      const value = evaluate(statement.sides[0] ?? [], ring, budget);
      return [...value]
        .sort(([a], [b]) => b - a)
        .map(([degree, words]) => ({
          degree,
          normalForm: withConstant(statement, degree, words, budget),
          canonical: true,
        }));
    },
    derivation(expression, form, conditions, budget) {
      const { letters, characteristic, constant } = open([expression], conditions, budget);
      if (letters.length === 0)
        return constants(characteristic, budget).derivation(constant(expression), form, [], budget);
      const atoms = factoredAtoms(letters.map((name) => letterElement(name)));
      const read = lettersReader(characteristic, conditions, budget);
      return derivation<FactoredAtom>(
        expression,
        form,
        () => ({
          atoms,
          rules: canonicalRules(atoms),
          read: (entry) => atomOf(read(entry), letters),
          compareWords: compareCanonicalWords,
          conclusion: `the coefficients of −1 in characteristic ${characteristic}`,
        }),
        budget,
      );
    },
    sideConditions: sideConditionsOf,
  };
}

/** An entry that has been read as ± a product of letters, as an atom of derivations. */
function atomOf(entry: LetterEntry, letters: readonly string[]): FactoredAtom {
  if (entry.kind !== 'signed') throw new RangeError('not a product of letters');
  const powers = [...entry.exponents].map(([name, e]) => [letters.indexOf(name), e] as const);
  return { negative: entry.negative, powers: powers.sort(([a], [b]) => a - b) };
}
