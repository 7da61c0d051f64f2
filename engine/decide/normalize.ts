import type { Budget } from '../arith/budget';
import type { Expression } from '../expression/expression';
import type { Condition } from '../expression/statement';
import type { DecidableField } from './decidable-field';
import type { NormalizeOutcome } from './outcome';

/**
 * The canonical form of an expression, degree by degree: with `canonical: true` two elements of the field are equal iff their
 * forms print alike.
 */
export function normalize(
  field: DecidableField,
  expression: Expression,
  options: { readonly steps?: boolean; readonly conditions?: readonly Condition[] },
  budget: Budget,
): NormalizeOutcome {
  const conditions = options.conditions ?? [];
  return {
    parts: field.normalForm(expression, conditions, budget),
    sideConditions: field.sideConditions([expression], conditions, budget),
  };
}
