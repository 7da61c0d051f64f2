import { jacobi } from '../arith/jacobi';
import { leastNonResidue } from '../arith/non-residue';
import { inverseModulo, modulo, powerModulo } from '../arith/modular';
import { integerElement } from '../expression/element';
import type { FiniteField } from './field';

/**
 * 𝔽_p for a prime p of any size. Its elements are the integers 0…p−1, in their order as integers.
 * That p is prime is the caller's knowledge and not tested again here; a p below 2 is a RangeError.
 */
export function primeField(p: bigint): FiniteField<bigint> {
  if (p < 2n) throw new RangeError('a prime field needs a prime');
  let leastNonSquare: bigint | undefined;
  const isSquare = (a: bigint): boolean => p === 2n || jacobi(a, p) === 1;
  return Object.freeze<FiniteField<bigint>>({
    name: `F_${p}`,
    tex: `\\mathbb{F}_{${p}}`,
    characteristic: p,
    order: p,
    zero: 0n,
    one: 1n,
    add(a, b) {
      const sum = a + b;
      return sum >= p ? sum - p : sum;
    },
    subtract: (a, b) => (a >= b ? a - b : a - b + p),
    multiply: (a, b) => (a * b) % p,
    negate: (a) => (a === 0n ? 0n : p - a),
    inverse(a) {
      if (a === 0n) throw new RangeError('0 has no inverse');
      return inverseModulo(a, p);
    },
    isZero: (a) => a === 0n,
    equal: (a, b) => a === b,
    fromInteger: (n) => modulo(n, p),
    letter: () => undefined,
    write: (a) => integerElement(a),
    element: (index) => index,
    index: (a) => a,
    power: (a, n) => powerModulo(a, n, p),
    /** Euler's criterion by reciprocity. */
    isSquare,
    get nonSquare() {
      if (p === 2n) return undefined;
      leastNonSquare ??= leastNonResidue(p);
      return leastNonSquare;
    },
  });
}
