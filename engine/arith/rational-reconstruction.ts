import { integerRoot } from './roots';
import { gcd } from './gcd';
import { modulo } from './modular';

/**
 * The fraction num/den ≡ a modulo m with |num|, den ≤ √(m/2) and den prime to m, if there is one; it is unique.
 * P. Wang, A p-adic algorithm for univariate partial fractions, SYMSAC 1981.
 */
export function rationalFromResidue(a: bigint, m: bigint): { readonly num: bigint; readonly den: bigint } | undefined {
  const bound = integerRoot(m / 2n, 2);
  let [r0, r1] = [m, modulo(a, m)];
  let [s0, s1] = [0n, 1n];
  while (r1 > bound) {
    const quotient = r0 / r1;
    [r0, r1] = [r1, r0 - quotient * r1];
    [s0, s1] = [s1, s0 - quotient * s1];
  }
  const [num, den] = s1 < 0n ? [-r1, -s1] : [r1, s1];
  return den === 0n || den > bound || gcd(den, m) !== 1n ? undefined : { num, den };
}
