import { bitLength } from './bits';
import { smallPower } from './modular';
import { exactSquareRoot, integerRoot } from './roots';
import { smallPrimes, primesBelow } from './small-primes';

/**
 * n = root^exponent with the exponent as large as possible, for n ≥ 1; (1, 1) for n = 1. The root is no perfect power.
 * Tries the prime exponents up to log₂ n. Before a root is taken, n must be a k-th power modulo two primes q ≡ 1 mod k.
 */
export function perfectPower(n: bigint): { readonly root: bigint; readonly exponent: number } {
  if (n < 1n) throw new RangeError('a perfect power is looked for in positive integers');
  let root = n;
  let exponent = 1;
  if (n === 1n) return { root, exponent };
  const bits = bitLength(n);
  const primes = bits < 4096 ? smallPrimes : primesBelow(bits + 1);
  for (const k of primes) {
    while (bitLength(root) > k) {
      const smaller = k === 2 ? exactSquareRoot(root) : exactRoot(root, k);
      if (smaller === undefined) break;
      root = smaller;
      exponent *= k;
    }
    if (bitLength(root) <= k) break;
  }
  return { root, exponent };
}

function exactRoot(n: bigint, k: number): bigint | undefined {
  if (!isPowerResidue(n, k)) return undefined;
  const root = integerRoot(n, k);
  return root ** BigInt(k) === n ? root : undefined;
}

function isPowerResidue(n: bigint, k: number): boolean {
  let tried = 0;
  for (let q = 2 * k + 1; tried < 2; q += 2 * k) {
    if (!isSmallPrime(q)) continue;
    tried++;
    const residue = Number(n % BigInt(q));
    if (residue !== 0 && smallPower(residue, BigInt((q - 1) / k), q) !== 1) return false;
  }
  return true;
}

function isSmallPrime(q: number): boolean {
  for (const p of smallPrimes) {
    if (p * p > q) return true;
    if (q % p === 0) return false;
  }
  return true;
}
