import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import type { AskedPlace } from './asked-place';
import type { DecidableField } from './decidable-field';
import type { ResiduesOutcome } from './outcome';

/**
 * Residues and specialisations of a class (F. Morel, LNM 2052, ch. 3): at the places asked for, or at every place where the class
 * ramifies. A uniformizer goes with exactly one place.
 */
export function residues(
  field: DecidableField,
  expression: Expression,
  options: { readonly places?: readonly AskedPlace[]; readonly uniformizer?: Element },
  budget: Budget,
): ResiduesOutcome {
  if (field.residues === undefined)
    throw new Refusal(
      'place',
      `Residues are taken along discrete valuations, and ${field.name} is given without any. Choose Q or a field of rational functions.`,
    );
  return field.residues(expression, options.places, options.uniformizer, budget);
}
