import type { Budget } from '../arith/budget';
import { Refusal } from '../expression/refusal';
import type { Condition } from '../expression/statement';
import { shownCondition } from '../expression/shown';
import type { Field } from '../field/field';
import { readElement } from '../field/read-element';

/**
 * Over a field whose elements are known a condition is simply true or false. A false one is refused, since a statement under it
 * would claim nothing.
 */
export function checkConcreteConditions<E>(field: Field<E>, conditions: readonly Condition[], budget: Budget): void {
  for (const condition of conditions) {
    const holds =
      condition.kind === 'characteristic'
        ? (condition.prime === field.characteristic) === condition.is
        : field.equal(readElement(condition.left, field, budget), readElement(condition.right, field, budget)) ===
          (condition.kind === 'equal');
    if (!holds)
      throw new Refusal(
        'hypothesis',
        `The condition ${shownCondition(condition)} does not hold in ${field.name}, so the statement would claim nothing. Leave it out or change the field.`,
        condition.at,
      );
  }
}
