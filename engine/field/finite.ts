import { unlimited, type Budget } from '../arith/budget';
import { perfectPower } from '../arith/perfect-power';
import { isPrime } from '../arith/prime';
import { extensionField } from './extension-field';
import type { FiniteField } from './field';
import { leastIrreducible } from './least-irreducible';
import { primeField } from './prime-field';

/**
 * 𝔽_q for any prime power q: the prime field, or 𝔽_p[letter] modulo the least monic irreducible polynomial of its degree,
 * under the name `F_q`. Throws a RangeError when q is no power of a prime.
 */
export function finiteField(order: bigint, letter = 'z', budget: Budget = unlimited): FiniteField<unknown> {
  const { prime, degree } = primePower(order, budget) ?? {};
  if (prime === undefined || degree === undefined) throw new RangeError(`${order} is not a power of a prime`);
  const base = primeField(prime);
  if (degree === 1) return base;
  const named = { name: `F_${order}`, tex: `\\mathbb{F}_{${order}}` };
  return extensionField(base, letter, leastIrreducible(base, degree, budget), named);
}

/** q = prime^degree, or `undefined` when q is no power of a prime. */
export function primePower(
  q: bigint,
  budget: Budget = unlimited,
): { readonly prime: bigint; readonly degree: number } | undefined {
  if (q < 2n) return undefined;
  const { root, exponent } = perfectPower(q);
  return isPrime(root, budget) ? { prime: root, degree: exponent } : undefined;
}
