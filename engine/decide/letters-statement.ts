import type { Budget } from '../arith/budget';
import { integerElement, type Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { mapEntries } from '../expression/map-entries';
import { Refusal } from '../expression/refusal';
import { shownElement } from '../expression/shown';
import type { Condition } from '../expression/statement';
import { lower } from '../ring/lower';
import type { Term } from '../ring/term';
import type { Monomial } from '../ring/word-ring';
import { minusOneElement } from '../ring/write-word';
import { lettersReader } from './letters-reading';
import { notAUnit } from './read-unit';

/** Words with entries in letters in kernel form. */
export interface LettersStatement {
  /** An expression without letters, its entries replaced by their values. */
  constant(expression: Expression): Expression;
  readonly sides: readonly (readonly Term<Monomial>[])[];
  readonly letters: readonly string[];
}

/** Reads entries as ± products of letters, or finds that there are no letters at all. */
export function readStatement(
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
