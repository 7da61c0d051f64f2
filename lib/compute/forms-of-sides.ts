import type { Budget } from '@/engine/arith/budget';
import { normalize } from '@/engine/decide/normalize';
import type { DecidableField } from '@/engine/decide/decidable-field';
import { Refusal } from '@/engine/expression/refusal';
import type { Statement } from '@/engine/expression/statement';
import type { Typeset } from '@/lib/contracts/typeset';
import { showExpression } from './show';

/** The canonical form of one side in each degree in which it is not zero. */
export type FormsByDegree = ReadonlyMap<number, Typeset & { readonly canonical: boolean }>;

/**
 * The canonical forms of the sides of a statement, in order. A side whose form the engine refuses, for time or for size, is
 * undefined: a verdict that stands is not taken back for want of a form.
 */
export function formsOf(field: DecidableField, statement: Statement, budget: Budget): (FormsByDegree | undefined)[] {
  return statement.sides.map((side) => {
    try {
      const { parts } = normalize(field, side, { conditions: statement.conditions }, budget);
      return new Map(
        parts.map(({ degree, normalForm, canonical }) => [degree, { ...showExpression(normalForm), canonical }]),
      );
    } catch (error) {
      if (error instanceof Refusal) return undefined;
      throw error;
    }
  });
}
