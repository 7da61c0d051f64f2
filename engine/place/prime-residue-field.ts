import { toInt, type Int } from '../arith/int';
import { integerElement, type Element } from '../expression/element';
import { primeField } from '../field/prime-field';
import type { WrittenField } from '../ring/write-residue-class';

/** 𝔽_p as the residue field at a prime of ℚ, its elements the integers 0 … p − 1. */
export function primeResidueField(p: bigint): WrittenField<Int> {
  const field = primeField(p);
  return {
    name: field.name,
    order: p,
    characteristic: p,
    write: (unit): Element => integerElement(BigInt(unit)),
    get nonSquare() {
      return field.nonSquare === undefined ? undefined : toInt(field.nonSquare);
    },
  };
}
