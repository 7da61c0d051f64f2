import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import { Refusal } from '../expression/refusal';
import { shownElement } from '../expression/shown';
import type { Field } from '../field/field';
import { elementReader } from '../field/read-element';

/** Reads entries in a field; an entry that is zero there is refused. */
export function unitReader<E>(field: Field<E>, budget: Budget): (entry: Element) => E {
  const read = elementReader(field, budget);
  return (entry) => {
    const value = read(entry);
    if (field.isZero(value)) throw notAUnit(entry, field.name);
    return value;
  };
}

/** The refusal of an entry that is zero. */
export function notAUnit(entry: Element, fieldName: string): Refusal {
  const text = shownElement(entry);
  const zero = text === '0' ? '0 is none' : `${text} is 0 in ${fieldName}`;
  return new Refusal('not-a-unit', `An entry of a symbol must be a unit, and ${zero}.`, entry.at);
}
