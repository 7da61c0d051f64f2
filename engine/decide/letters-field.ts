import type { Budget } from '../arith/budget';
import { canonicalRules } from '../derive/canonical-rules';
import { derivation } from '../derive/derivation';
import { compareCanonicalWords, factoredAtoms, type FactoredAtom } from '../derive/factored-atoms';
import type { Expression } from '../expression/expression';
import type { FieldName } from '../expression/field-name';
import { Refusal } from '../expression/refusal';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import { characteristicClass } from '../ring/sign-ring';
import { tabledRing } from '../ring/tabled-ring';
import { wordRing, type Monomial, type Words } from '../ring/word-ring';
import { total } from '../ring/write-word';
import type { DecidableField, Decision } from './decidable-field';
import { sideConditionsOf } from './letters-conditions';
import { constantForm } from './letters-constant';
import { verdictsOf } from './judged';
import { decideLetters, settledBySearch } from './letters-decision';
import { withExample, withoutLetters } from './letters-example';
import { separationFinding } from './letters-findings';
import { seeLetters } from './letters-places';
import type { Claim, DecideOver } from './letters-refute';
import { lettersOfElement, forEachElement } from './letters-seen';
import { monomialAt, readStatement, type LettersStatement } from './letters-statement';
import { wordFindings, writeWord, writeWords } from './letters-words';
import type { NormalizedDegree } from './outcome';

const THEOREM =
  'Canonical words in independent letters are a basis, over every field at once: residues along each letter in turn are split exact ' +
  '(F. Morel, A¹-Algebraic Topology over a Field, LNM 2052, Theorem 3.24, number from memory).';

/**
 * `any`: an unspecified field whose units are the letters. An equality holds for every field and all values for which its entries
 * are units iff it holds over ℚ(letters), for values are reached by specialisation along a regular local ring of ℤ[letters]
 * (F. Morel, LNM 2052, ch. 3); under `char = p` iff it holds over 𝔽_p(letters). Entries that are ± products of letters are decided by
 * canonical words; without letters the field is ℚ or 𝔽_p, with one letter ℚ(t) or 𝔽_p(t), which `concrete` gives. Otherwise see
 * `decideLetters`.
 */
export function lettersField(concrete: (name: FieldName, budget: Budget) => DecidableField): DecidableField {
  const baseOf = (characteristic: bigint): FieldName =>
    characteristic === 0n ? { kind: 'rationals' } : { kind: 'finite', order: characteristic };
  const constants = (characteristic: bigint, budget: Budget): DecidableField =>
    concrete(baseOf(characteristic), budget);

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
  const withConstant = (statement: LettersStatement, degree: number, words: Words, budget: Budget): Expression => {
    const elements = statement.generators.map(({ element }) => element);
    const constant = words.get(0n);
    if (statement.characteristic === 0n || constant === undefined) return writeWords(elements, degree, words);
    const rest = new Map([...words].filter(([mask]) => mask !== 0n));
    const written = constantForms(statement.characteristic, total(writeWord([], degree, 0n, constant)), budget);
    return total([...written.map(({ normalForm }) => normalForm), writeWords(elements, degree, rest)]);
  };

  /** What the field of rational functions in the one letter gives; nothing where it does not decide. */
  const overOneLetter = <T>(
    statement: LettersStatement,
    budget: Budget,
    ask: (field: DecidableField, name: string) => T,
  ): T | undefined => {
    const [letter, more] = statement.letters;
    if (letter === undefined || more !== undefined || isOfMonomials(statement)) return undefined;
    try {
      const field = concrete({ kind: 'functions', base: baseOf(statement.characteristic), letter }, budget);
      return ask(field, field.name);
    } catch (error) {
      if (error instanceof Refusal && error.code === 'not-yet') return undefined;
      throw error;
    }
  };
  /** As it was typed where that can be read with the letters that are left, else with the values of the entries. */
  const readable = (statement: LettersStatement, expression: Expression): Expression => {
    const names = new Set<string>();
    forEachElement(expression, (entry) => lettersOfElement(entry, names));
    const asTyped = statement.solved.size === 0 && [...names].every((name) => statement.letters.includes(name));
    return asTyped ? expression : statement.valued(expression);
  };

  const decideWords = (statement: LettersStatement, budget: Budget): Decision => {
    const char = characteristicClass(statement.characteristic);
    const ring = tabledRing(wordRing(char, budget), monomialAt(statement.monomials));
    const [l = [], r = []] = statement.sides;
    const [lv, rv] = [evaluate(l, ring, budget), evaluate(r, ring, budget)];
    const elements = statement.generators.map(({ element }) => element);
    const findings = degreesOf([...l, ...r]).flatMap((degree) =>
      wordFindings(char, elements, degree, lv.get(degree), rv.get(degree)),
    );
    return { findings, theorem: THEOREM };
  };

  const decide: DecidableField['decide'] = (left, right, conditions, budget) => {
    const statement = readStatement([left, right], conditions, budget);
    const { characteristic, letters, valued } = statement;
    const claim: Claim = { left, right, conditions, statement };
    const decideOver: DecideOver = (name) => decideAt(name, budget);
    if (letters.length === 0) {
      const field = constants(characteristic, budget);
      const decision = field.decide(valued(left), valued(right), [], budget);
      const { name, tex } = field;
      return withoutLetters(claim, { ...decision, theorem: everywhere(name, decision.theorem) }, { name, tex });
    }
    if (isOfMonomials(statement)) return withExample(claim, decideWords(statement, budget), decideOver, budget);
    const decided = overOneLetter(statement, budget, (field, name) => {
      const decision = field.decide(readable(statement, left), readable(statement, right), [], budget);
      return { ...decision, theorem: everywhere(name, decision.theorem) };
    });
    if (decided === undefined) return decideLetters(claim, decideOver, budget);
    if (![...verdictsOf(decided).values()].includes('undecided'))
      return withExample(claim, decided, decideOver, budget);
    return settledBySearch(decided, decideLetters(claim, decideOver, budget));
  };
  /** A field that letters are given values in. In `any` they leave products of letters with constants. */
  const decideAt = (name: FieldName, budget: Budget): Pick<DecidableField, 'name' | 'tex' | 'decide'> =>
    name.kind === 'any' ? { name: 'any', tex: 'F', decide: decideScaled } : concrete(name, budget);

  /** Entries that are constants times products of letters: residues along the letters lead to the constants in any case. */
  const decideScaled: DecidableField['decide'] = (left, right, conditions, budget) => {
    const statement = readStatement([left, right], conditions, budget);
    if (isOfMonomials(statement)) return decideWords(statement, budget);
    const [l = [], r = []] = statement.sides;
    const { separations } = seeLetters(statement.ring, statement.entries, [l, r], budget);
    return {
      findings: [...separations.values()].map((separation) => separationFinding(statement, separation)),
      theorem: THEOREM,
    };
  };

  return {
    name: 'any',
    tex: 'F',
    decide,
    normalForm(expression, conditions, budget) {
      const statement = readStatement([expression], conditions, budget);
      if (statement.letters.length === 0)
        return constantForms(statement.characteristic, statement.valued(expression), budget);
      const found = overOneLetter(statement, budget, (field) =>
        field.normalForm(readable(statement, expression), [], budget),
      );
      if (found !== undefined) return found;
      const ring = tabledRing(
        wordRing(characteristicClass(statement.characteristic), budget),
        monomialAt(statement.monomials),
      );
      const value = evaluate(statement.sides[0] ?? [], ring, budget);
      const canonical = isOfMonomials(statement);
      return [...value]
        .sort(([a], [b]) => b - a)
        .map(([degree, words]) => ({ degree, normalForm: withConstant(statement, degree, words, budget), canonical }));
    },
    derivation(expression, form, conditions, budget) {
      const statement = readStatement([expression], conditions, budget);
      if (statement.letters.length === 0)
        return constants(statement.characteristic, budget).derivation(statement.valued(expression), form, [], budget);
      const found = overOneLetter(statement, budget, (field) => ({
        steps: field.derivation(readable(statement, expression), form, [], budget),
      }));
      if (found !== undefined) return found.steps;
      const atoms = factoredAtoms(statement.generators.map(({ element }) => element));
      return derivation<FactoredAtom>(
        expression,
        form,
        () => ({
          atoms,
          rules: canonicalRules(atoms),
          read: (entry) => atomOf(statement.monomial(entry)),
          compareWords: compareCanonicalWords,
          conclusion: `the coefficients of −1 in characteristic ${statement.characteristic}`,
        }),
        budget,
      );
    },
    sideConditions: sideConditionsOf,
  };
}

/** Whether all entries are ± products of letters. */
const isOfMonomials = ({ generators }: LettersStatement): boolean => generators.every(({ kind }) => kind === 'letter');

const everywhere = (name: string, theorem: string): string =>
  `It holds over every such field iff it holds over ${name}. ${theorem}`;

const atomOf = ({ negative, exponents }: Monomial): FactoredAtom => ({ negative, powers: [...exponents] });
