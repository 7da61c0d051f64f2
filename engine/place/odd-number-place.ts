import { jacobi } from '../arith/jacobi';
import { modulo } from '../arith/modular';
import { remainderPolynomial, resultant, trimmed } from '../field/polynomial';
import { primeField } from '../field/prime-field';
import type { PrimeIdeal } from '../field/prime-ideal';
import type { Coordinates } from '../field/order';
import type { NumberPlace } from './number-place';

/**
 * The place at a prime ideal above an odd prime: bit 0 of a class is the quadratic character of the unit, bit 1 the parity of the order.
 * The symbol is the quadratic character of the tame symbol: J.-P. Serre, Local Fields, XIV.3, Proposition 8 (number from memory).
 */
export function oddNumberPlace(prime: PrimeIdeal): NumberPlace {
  const minusOne = prime.residueOrder % 4n === 3n ? 1n : 0n;
  return {
    classOf(a, bound) {
      const found = prime.unitPart(prime.order.coordinates(a), bound, 1);
      if (found === undefined) throw new RangeError('an order past its bound');
      return (isSquareResidue(prime, found.unit) ? 0n : 1n) | (found.order % 2 === 1 ? 2n : 0n);
    },
    hilbert(x, y) {
      const [orderX, orderY] = [x >> 1n, y >> 1n];
      const value = (orderX & orderY & minusOne) ^ (x & 1n & orderY) ^ (y & 1n & orderX);
      return value === 1n ? 1 : 0;
    },
  };
}

/** Whether a unit modulo p is a square modulo the prime. */
function isSquareResidue(prime: PrimeIdeal, unit: Coordinates): boolean {
  const { generator, order, p } = prime;
  if (generator !== undefined) {
    // the norm to 𝔽_p keeps the character
    const field = primeField(p);
    const reduced = trimmed(
      field,
      order.polynomial(unit).map((c) => modulo(c, p)),
    );
    return jacobi(resultant(field, generator, remainderPolynomial(field, reduced, generator)), p) === 1;
  }
  const character = order.power(prime.residue(unit), (prime.residueOrder - 1n) / 2n, p);
  const one = prime.one(1);
  return character.every((c, i) => c === one[i]);
}
