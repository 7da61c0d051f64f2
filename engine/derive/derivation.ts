import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import { expressionText } from '../expression/to-text';
import { collect, writeCombination, type Atoms, type Word } from './combination';
import { expand, TooLong } from './expand';
import { RELATIONS } from './relations';
import { derive, type DerivationStep, type Rule } from './rule';

/** What a field needs to give so that the canonical form of an expression can be derived in it. */
export interface DerivationRules<A> {
  readonly atoms: Atoms<A>;
  readonly rules: readonly Rule<A>[];
  read(entry: Element): A;
  /** The order in which words of the last line stand. */
  compareWords(a: Word<A>, b: Word<A>): number;
  /** By what the last line is the canonical form, where the rules alone do not reach it. */
  readonly conclusion: string;
}

/**
 * The derivation of the canonical form: definitions, relations one by one down to canonical words, and, where these are not
 * the canonical form of the field, the invariants that end it. `undefined` where it would be too long to read, or its budget ends.
 */
export function derivation<A>(
  expression: Expression,
  canonicalForm: Expression,
  prepare: () => DerivationRules<A>,
  budget: Budget,
): readonly DerivationStep[] | undefined {
  try {
    const { atoms, rules, read, compareWords, conclusion } = prepare();
    const start = expand(expression, read);
    const { steps, words } = derive(atoms, start, rules, budget);
    const opening = writeCombination(atoms, collect(atoms, start));
    const all: DerivationStep[] = [];
    if (expressionText(opening) !== expressionText(expression))
      all.push({ relation: RELATIONS.definitions, args: [], before: expression, after: opening });
    all.push(...steps);
    const last = all[all.length - 1];
    const sorted = writeCombination(atoms, [...words].sort(compareWords));
    if (expressionText(sorted) !== expressionText(canonicalForm))
      all.push({ relation: conclusion, args: [], before: last?.after ?? expression, after: canonicalForm });
    else if (last !== undefined) all[all.length - 1] = { ...last, after: canonicalForm };
    return all;
  } catch (error) {
    const endsHere =
      error instanceof TooLong || (error instanceof Refusal && (error.code === 'budget' || error.code === 'size'));
    if (endsHere) return undefined;
    throw error;
  }
}
