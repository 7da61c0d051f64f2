import type { Budget } from '../arith/budget';
import type { Expression } from '../expression/expression';
import type { Condition } from '../expression/statement';
import { total } from '../ring/write-word';
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
  const parts = field.normalForm(expression, conditions, budget);
  const form = total(parts.map(({ normalForm }) => normalForm));
  const steps = options.steps ? field.derivation(expression, form, conditions, budget) : undefined;
  return {
    parts,
    ...(steps && { steps }),
    sideConditions: field.sideConditions([expression], conditions, budget),
  };
}
