import type { Budget } from '@/engine/arith/budget';
import type { DecidableField } from '@/engine/decide/decidable-field';
import { resolveField } from '@/engine/decide/registry';
import type { Element } from '@/engine/expression/element';
import type { FieldName } from '@/engine/expression/field-name';
import { fieldNameText } from '@/engine/expression/to-text';
import { primePower } from '@/engine/field/finite';
import { leastIrreducible } from '@/engine/field/least-irreducible';
import { primeField } from '@/engine/field/prime-field';
import { writePolynomial } from '@/engine/field/write-polynomial';

/** A field with what an answer tells about it. */
export interface ResolvedField {
  readonly field: DecidableField;
  /** The polynomial whose root generates a finite field over its base; absent for prime fields and for all other fields. */
  readonly modulus?: Element;
}

/** Fields that were resolved lately: finding the modulus of a large finite field takes longer than most questions over it. */
const resolved = new Map<string, ResolvedField>();
const mostResolved = 64;

/** The field of a name, by the registry or from the last few that were asked for. Refuses what the registry refuses. */
export function fieldOf(name: FieldName, budget: Budget): ResolvedField {
  const text = fieldNameText(name);
  const found = resolved.get(text) ?? { field: resolveField(name, budget), modulus: modulusOf(name, budget) };
  resolved.delete(text);
  resolved.set(text, found);
  const oldest = resolved.keys().next();
  if (resolved.size > mostResolved && oldest.done !== true) resolved.delete(oldest.value);
  return found;
}

function modulusOf(name: FieldName, budget: Budget): Element | undefined {
  if (name.kind === 'extension') return name.modulus;
  if (name.kind !== 'finite') return undefined;
  const power = primePower(name.order, budget);
  if (power === undefined || power.degree === 1) return undefined;
  const base = primeField(power.prime);
  return writePolynomial(base, leastIrreducible(base, power.degree, budget), 'z');
}
