import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import type { Budget } from '../arith/budget';
import { collect, writeCombination, type Atoms, type Combination, type Letter, type Word } from './combination';
import { DERIVATION_WORDS, TooLong } from './expand';
import { RELATIONS, type RelationKey } from './relations';

/** One application of a relation at fixed arguments, wherever it applies. */
export interface Application<A> {
  readonly relation: RelationKey;
  readonly args: readonly A[];
  /** What a word becomes; `undefined` where the relation does not apply to it. */
  rewrite(word: Word<A>): readonly Word<A>[] | undefined;
}

/** An oriented rule: finds the next application in a combination. `measure` says what every application makes smaller. */
export interface Rule<A> {
  readonly measure: string;
  next(words: Combination<A>): Application<A> | undefined;
}

export interface DerivationStep {
  readonly relation: string;
  readonly args: readonly Element[];
  readonly before: Expression;
  readonly after: Expression;
}

/** A derivation with more steps than this is not shown. */
const STEP_LIMIT = 200;

/**
 * Applies the first rule that applies, until none does, and records each application: the relation, its arguments, the whole
 * expression before and after. Ends because every rule makes its measure smaller. Throws TooLong past the limits.
 */
export function derive<A>(
  atoms: Atoms<A>,
  start: readonly Word<A>[],
  rules: readonly Rule<A>[],
  budget: Budget,
): { readonly steps: readonly DerivationStep[]; readonly words: Combination<A> } {
  let words = collect(atoms, start);
  const steps: DerivationStep[] = [];
  for (;;) {
    budget.spend('deriving the canonical word');
    const application = firstApplication(rules, words);
    if (application === undefined) return { steps, words };
    const before = writeCombination(atoms, words);
    words = everywhere(atoms, words, application);
    steps.push({
      relation: RELATIONS[application.relation],
      args: application.args.map((atom) => atoms.write(atom)),
      before,
      after: writeCombination(atoms, words),
    });
    if (steps.length > STEP_LIMIT) throw new TooLong();
  }
}

function firstApplication<A>(rules: readonly Rule<A>[], words: Combination<A>): Application<A> | undefined {
  for (const rule of rules) {
    const application = rule.next(words);
    if (application !== undefined) return application;
  }
  return undefined;
}

function everywhere<A>(atoms: Atoms<A>, words: Combination<A>, { rewrite }: Application<A>): Combination<A> {
  let current = words;
  for (;;) {
    let changed = false;
    const next = current.flatMap((word) => {
      const rewritten = rewrite(word);
      if (rewritten === undefined) return [word];
      changed = true;
      return rewritten;
    });
    if (!changed) return current;
    current = collect(atoms, next);
    if (current.length > DERIVATION_WORDS) throw new TooLong();
  }
}

/** The word with the letters from `at`, `length` of them, replaced in turn by each of the given pieces. */
export function splice<A>(
  word: Word<A>,
  at: number,
  length: number,
  pieces: readonly { readonly coefficient: bigint; readonly letters: readonly Letter<A>[] }[],
): readonly Word<A>[] {
  return pieces.map((piece) => ({
    coefficient: word.coefficient * piece.coefficient,
    letters: [...word.letters.slice(0, at), ...piece.letters, ...word.letters.slice(at + length)],
  }));
}
