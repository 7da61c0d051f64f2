import type { Budget } from '../arith/budget';
import { canonicalRules } from '../derive/canonical-rules';
import { derivation } from '../derive/derivation';
import { compareCanonicalWords, factoredAtoms, type FactoredAtom } from '../derive/factored-atoms';
import { integerElement, letterElement, type Element } from '../expression/element';
import { symbol, type Expression } from '../expression/expression';
import type { FieldName } from '../expression/field-name';
import { mapEntries } from '../expression/map-entries';
import { Refusal } from '../expression/refusal';
import type { Condition } from '../expression/statement';
import { shownElement } from '../expression/shown';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import { lower } from '../ring/lower';
import {
  characteristicClass,
  isZeroModEta,
  isZeroModH,
  type CharacteristicClass,
  type SignClass,
} from '../ring/sign-ring';
import type { Term } from '../ring/term';
import { countBits, lettersOf, wordRing, type Monomial, type Words } from '../ring/word-ring';
import { etaFactors, minusOneElement, multiple, symbolFactors, total, zeroExpression } from '../ring/write-word';
import type { DecidableField } from './decidable-field';
import type { Finding } from './finding';
import { characteristicOf, lettersReader, type LetterEntry } from './letters-reading';
import { sideConditionsOf } from './letters-conditions';
import { notAUnit } from './read-unit';

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
  /** In characteristic p the part without letters is written as over 𝔽_p, so that it has one form whatever else is in sight. */
  const withConstant = (
    statement: ReturnType<typeof open>,
    degree: number,
    words: Words,
    budget: Budget,
  ): Expression => {
    const constant = words.get(0n);
    if (statement.characteristic === 0n || constant === undefined) return writeWords(statement.letters, degree, words);
    const rest = new Map([...words].filter(([mask]) => mask !== 0n));
    const form = constants(statement.characteristic, budget).normalForm(
      total(writeWord([], degree, 0n, constant)),
      [],
      budget,
    );
    return total([...form.map(({ normalForm }) => normalForm), writeWords(statement.letters, degree, rest)]);
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
        return constants(statement.characteristic, budget).normalForm(statement.constant(expression), [], budget);
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

interface LettersStatement {
  /** An expression without letters, its entries replaced by their values. */
  constant(expression: Expression): Expression;
  readonly sides: readonly (readonly Term<Monomial>[])[];
  readonly letters: readonly string[];
}

/** Reads entries as ± products of letters, or finds that there are no letters at all. */
function readStatement(
  expressions: readonly Expression[],
  characteristic: bigint,
  conditions: readonly Condition[],
  budget: Budget,
): LettersStatement {
  const read = lettersReader(characteristic, conditions, budget);
  const names = new Set<string>();
  let refused: { readonly entry: Element; readonly constant: boolean } | undefined;
  interface Named {
    readonly negative: boolean;
    readonly exponents: ReadonlyMap<string, bigint>;
  }
  const named = expressions.map((expression) =>
    lower(expression, (entry): Named => {
      const value = read(entry);
      if (value.kind === 'zero')
        throw notAUnit(entry, characteristic === 0n ? 'every field' : `characteristic ${characteristic}`);
      if (value.kind === 'signed') {
        for (const name of value.exponents.keys()) names.add(name);
        return value;
      }
      if (refused === undefined || (refused.constant && value.kind === 'other'))
        refused = { entry, constant: value.kind === 'constant' };
      return { negative: false, exponents: new Map() };
    }),
  );
  if (refused !== undefined && (names.size > 0 || !refused.constant)) {
    throw new Refusal(
      'not-yet',
      `Over an unspecified field this version decides entries that are products of letters, and ${shownElement(refused.entry)} is none. Use letters only, or choose a field.`,
      refused.entry.at,
    );
  }
  const constantOf = (entry: Element): Element => {
    const value = read(entry);
    if (value.kind === 'constant') return { ...value.value, at: entry.at };
    return { ...(value.kind === 'signed' && value.negative ? minusOneElement : integerElement(1n)), at: entry.at };
  };
  const letters = [...names].sort(compareLetters);
  const indexOf = new Map(letters.map((name, i) => [name, i]));
  const monomials = new Map<Named, Monomial>();
  const monomial = (value: Named): Monomial => {
    const known = monomials.get(value);
    if (known !== undefined) return known;
    const exponents = new Map(
      [...value.exponents].map(([name, e]) => [indexOf.get(name) ?? 0, e] as const).sort(([a], [b]) => a - b),
    );
    const made: Monomial = { negative: value.negative, exponents };
    monomials.set(value, made);
    return made;
  };
  return {
    letters,
    constant: (expression) => mapEntries(expression, constantOf),
    sides: named.map((terms) => terms.map((term) => mapTerm(term, monomial))),
  };
}

/** The same term with every entry replaced. */
function mapTerm<A, B>(term: Term<A>, f: (entry: A) => B): Term<B> {
  return {
    ...term,
    angles: term.angles.map(f),
    factors: term.factors.map((factor) =>
      factor.kind === 'symbol'
        ? { kind: 'symbol', entry: f(factor.entry) }
        : { ...factor, of: factor.of.map((inner) => mapTerm(inner, f)) },
    ),
  };
}

/** The order of letters: by name, then by index as a number, then by primes. */
function compareLetters(a: string, b: string): number {
  const parts = (name: string): readonly [string, bigint, number] => {
    const digits = /[0-9]+/.exec(name)?.[0];
    return [name.charAt(0), digits === undefined ? -1n : BigInt(digits), name.length];
  };
  const [x, y] = [parts(a), parts(b)];
  if (x[0] !== y[0]) return x[0] < y[0] ? -1 : 1;
  if (x[1] !== y[1]) return x[1] < y[1] ? -1 : 1;
  return x[2] - y[2] || (a < b ? -1 : a > b ? 1 : 0);
}

function wordFindings(
  char: CharacteristicClass,
  letters: readonly string[],
  degree: number,
  left: Words | undefined,
  right: Words | undefined,
): readonly Finding[] {
  const masks = new Set([...(left?.keys() ?? []), ...(right?.keys() ?? [])]);
  if (masks.size === 0) masks.add(0n);
  return sortMasks(masks).map((mask): Finding => {
    const [l, r] = [left?.get(mask), right?.get(mask)];
    const own = degree - countBits(mask);
    const difference: SignClass = { x: (l?.x ?? 0n) - (r?.x ?? 0n), y: (l?.y ?? 0n) - (r?.y ?? 0n) };
    const same = difference.x === 0n && difference.y === 0n;
    const write = (b: SignClass | undefined): Expression =>
      b === undefined ? zeroExpression : total(writeWord(letters, own, mask, b));
    return {
      map: 'word',
      degree,
      same,
      zero: l === undefined && r === undefined,
      sameModEta: same || isZeroModEta(own, difference),
      sameModH: same || isZeroModH(char, own, difference),
      left: () => write(l),
      right: () => write(r),
      target: () => coefficientGroup(char, own),
      reason: () => 'Canonical words in independent letters are a basis, and these coefficients differ.',
    };
  });
}

function coefficientGroup(char: CharacteristicClass, degree: number): string {
  if (degree === 0)
    return char === 'zero'
      ? '\\mathbb{Z}^{2}'
      : char === 'three-mod-four'
        ? '\\mathbb{Z}\\oplus\\mathbb{Z}/2'
        : '\\mathbb{Z}';
  if (char === 'zero') return '\\mathbb{Z}';
  if (degree < 0) return char === 'three-mod-four' ? '\\mathbb{Z}/4' : '\\mathbb{Z}/2';
  return degree === 1 && char !== 'two' ? '\\mathbb{Z}/2' : '0';
}

/** Words with fewer letters first, then by their letters. */
function sortMasks(masks: Iterable<bigint>): readonly bigint[] {
  return [...masks]
    .map((mask) => ({ mask, letters: lettersOf(mask) }))
    .sort(({ letters: x }, { letters: y }) => {
      const at = x.findIndex((letter, i) => letter !== y[i]);
      return x.length - y.length || (at < 0 ? 0 : (x[at] ?? 0) - (y[at] ?? 0));
    })
    .map(({ mask }) => mask);
}

function writeWords(letters: readonly string[], degree: number, words: Words): Expression {
  return total(
    sortMasks(words.keys()).flatMap((mask) =>
      writeWord(letters, degree - countBits(mask), mask, words.get(mask) ?? { x: 0n, y: 0n }),
    ),
  );
}

/** b·[p_S] for a coefficient b of degree `own`. */
function writeWord(letters: readonly string[], own: number, mask: bigint, { x, y }: SignClass): readonly Expression[] {
  const tail = lettersOf(mask).map((i) => symbol([letterElement(letters[i] ?? 'a')]));
  const plain =
    x === 0n
      ? []
      : [
          multiple(x, [
            ...etaFactors(own < 0 ? -own : 0),
            ...symbolFactors(minusOneElement, own > 0 ? own : 0),
            ...tail,
          ]),
        ];
  return y === 0n ? plain : [...plain, multiple(y, [...etaFactors(1), ...symbolFactors(minusOneElement, 1), ...tail])];
}
