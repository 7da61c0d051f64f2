import { unlimited, type Budget } from '../arith/budget';
import { bitLength } from '../arith/bits';
import type { Element } from '../expression/element';
import type { FieldName } from '../expression/field-name';
import { Refusal } from '../expression/refusal';
import type { Span } from '../expression/span';
import { fieldNameText } from '../expression/to-text';
import { checkedModulus, short } from './checked-modulus';
import { extensionField } from './extension-field';
import type { FiniteField } from './field';
import { finiteField, primePower } from './finite';
import { leastFactor } from './irreducible';
import { leastIrreducible } from './least-irreducible';
import { degree } from './polynomial';
import { DEGREE_LIMIT } from './read-modulus';

/** The binary digits of 10^10000: larger fields are refused. */
const ORDER_BITS = 33220;

/**
 * The finite field with a written name: `F_q` for a prime power q, or base[letter]/(modulus) over a finite field, towers
 * included. The modulus may be any polynomial in the letter that is irreducible over the base; it is made monic.
 *
 * Refuses, with the reason and what to type instead: `field` for an order that is no prime power, a letter used twice, a modulus that is
 * zero, constant, reducible or no polynomial; `unknown-letter` and `division-by-zero` inside the modulus; `size` for a degree past 200 or more than 10^4 digits in the
 * order; and `field` for the name of a field that is not finite.
 */
export function resolveFiniteField(name: FieldName, budget: Budget = unlimited): FiniteField<unknown> {
  switch (name.kind) {
    case 'finite':
      return ofOrder(name.order, budget, name.at);
    case 'extension': {
      const base = resolveFiniteField(name.base, budget);
      return withModulus(base, name.letter, name.modulus, budget, name.at);
    }
    default:
      throw new Refusal('field', `${fieldNameText(name)} is not a finite field. Type one such as F_7 or F_9.`, name.at);
  }
}

function ofOrder(order: bigint, budget: Budget, at: Span | undefined): FiniteField<unknown> {
  if (bitLength(order) > ORDER_BITS) throw tooLarge(at);
  budget.spend('reading the order of a finite field');
  const found = primePower(order, budget);
  if (found === undefined) throw new Refusal('field', notPrimePower(order, budget), at);
  if (found.degree > DEGREE_LIMIT) {
    throw new Refusal(
      'size',
      `F_${short(order)} has degree ${found.degree}, past ${DEGREE_LIMIT}. Type a smaller field.`,
      at,
    );
  }
  return finiteField(order, 'z', budget);
}

const tooLarge = (at: Span | undefined): Refusal =>
  new Refusal('size', 'The order of this field has more than 10000 digits. Type a smaller field.', at);

function notPrimePower(order: bigint, budget: Budget): string {
  const elements = order === 1n ? 'element' : 'elements';
  const fact = `${short(order)} is not a power of a prime, so that there is no field with ${short(order)} ${elements}.`;
  if (order < 2n) return `${fact} The least finite field is F_2.`;
  if (bitLength(order) > 64) return `${fact} Type a power of a prime.`;
  let below = order - 1n;
  while (primePower(below, budget) === undefined) below--;
  let above = order + 1n;
  while (primePower(above, budget) === undefined) above++;
  return `${fact} Type F_${below} or F_${above}.`;
}

function withModulus<E>(
  base: FiniteField<E>,
  letter: string,
  written: Element,
  budget: Budget,
  at: Span | undefined,
): FiniteField<unknown> {
  const modulus = checkedModulus(
    base,
    letter,
    written,
    {
      example: () => leastIrreducible(base, 2, budget),
      checkSize(f, where) {
        if (bitLength(base.order) * degree(f) > ORDER_BITS) throw tooLarge(where);
      },
      factor: (f, doing) => leastFactor(base, f, budget, doing),
    },
    budget,
    at,
  );
  return extensionField(base, letter, modulus);
}
