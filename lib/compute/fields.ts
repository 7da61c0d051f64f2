import type { Budget } from '@/engine/arith/budget';
import { type DecidableField, resolveField } from '@/engine/decide/registry';
import type { FieldName } from '@/engine/expression/field-name';
import { fieldNameText } from '@/engine/expression/to-text';

/** Fields that were resolved lately: finding the modulus of a large finite field takes longer than most questions over it. */
const resolved = new Map<string, DecidableField>();
const mostResolved = 64;

/** The field of a name, by the registry or from the last few that were asked for. Refuses what the registry refuses. */
export function fieldOf(name: FieldName, budget: Budget): DecidableField {
  const text = fieldNameText(name);
  const known = resolved.get(text);
  const field = known ?? resolveField(name, budget);
  resolved.delete(text);
  resolved.set(text, field);
  const oldest = resolved.keys().next();
  if (resolved.size > mostResolved && oldest.done !== true) resolved.delete(oldest.value);
  return field;
}
