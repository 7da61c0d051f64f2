import type { Budget } from '../arith/budget';
import type { FieldName } from '../expression/field-name';
import { checkedModulus } from './checked-modulus';
import { factorOverRationals } from './factor-rational';
import { numberField, type NumberField } from './number-field';
import { degree } from './polynomial';
import { rational, rationals } from './rational';

/**
 * The number field Q[letter]/(modulus); the modulus may be any polynomial that is irreducible over ℚ and is made monic. Refuses what
 * `checkedModulus` refuses.
 */
export function resolveNumberField(name: FieldName & { kind: 'extension' }, budget: Budget): NumberField {
  const modulus = checkedModulus(
    rationals,
    name.letter,
    name.modulus,
    {
      example: () => [rational(1n), rational(0n), rational(1n)],
      factor(f, doing) {
        const [first] = factorOverRationals(f, budget, doing).factors;
        return first === undefined || degree(first.factor) === degree(f) ? undefined : first.factor;
      },
    },
    budget,
    name.at,
  );
  return numberField(name.letter, modulus);
}
