import { toInt, type Int } from '../arith/int';
import { leastNonResidue } from '../arith/non-residue';
import { integerElement, type Element } from '../expression/element';
import type { WrittenField } from '../ring/write-residue-class';

/** 𝔽_p as the residue field at a prime of ℚ, its elements the integers 0 … p − 1. */
export function primeResidueField(p: bigint): WrittenField<Int> {
  return {
    name: `F_${p}`,
    order: p,
    characteristic: p,
    write: (unit): Element => integerElement(BigInt(unit)),
    get nonSquare() {
      return p === 2n ? undefined : toInt(leastNonResidue(p));
    },
  };
}
