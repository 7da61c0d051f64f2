import type { Int } from '../arith/int';
import type { Field } from '../field/field';

/** a^n for a unit a and any integer n. */
export function unitPower<E>(field: Field<E>, a: E, n: Int): E {
  if (n === 1) return a;
  if (n === -1) return field.inverse(a);
  if (field.power !== undefined) return field.power(a, BigInt(n));
  const factor = n < 0 ? field.inverse(a) : a;
  let result = field.one;
  for (const bit of (n < 0 ? -n : n).toString(2)) {
    result = field.multiply(result, result);
    if (bit === '1') result = field.multiply(result, factor);
  }
  return result;
}
