import { unlimited, type Budget } from './budget';
import { trailingZeros } from './bits';
import { gcd } from './gcd';
import { jacobi } from './jacobi';
import { modulo } from './modular';
import { exactSquareRoot } from './roots';

/**
 * The strong Lucas test of odd n > 2 with Selfridge's parameters (method A of R. Baillie, S. Wagstaff, Lucas pseudoprimes,
 * Math. Comp. 35 (1980)): D the first of 5, −7, 9, −11, … with (D/n) = −1, P = 1, Q = (1−D)/4. False proves n composite.
 */
export function isStrongLucasProbablePrime(n: bigint, budget: Budget = unlimited): boolean {
  const d = discriminant(n);
  if (d === undefined) return false;
  const q = modulo((1n - d) / 4n, n);
  const twos = trailingZeros(n + 1n);
  const half = (x: bigint): bigint => ((x & 1n) === 0n ? x : x + n) >> 1n;

  // (U_k, V_k, Q^k) along the binary digits of the odd part of n + 1.
  let u = 1n;
  let v = 1n;
  let qk = q;
  for (const bit of ((n + 1n) >> BigInt(twos)).toString(2).slice(1)) {
    budget.spend('testing whether a number is prime');
    u = (u * v) % n;
    v = modulo(v * v - 2n * qk, n);
    qk = (qk * qk) % n;
    if (bit === '1') {
      [u, v] = [half((u + v) % n), half(modulo(d * u + v, n))];
      qk = (qk * q) % n;
    }
  }
  if (u === 0n || v === 0n) return true;
  for (let i = 1; i < twos; i++) {
    v = modulo(v * v - 2n * qk, n);
    if (v === 0n) return true;
    qk = (qk * qk) % n;
  }
  return false;
}

/** Selfridge's D; `undefined` when the search shows that n is composite. A square has no D, so that it is looked at early. */
function discriminant(n: bigint): bigint | undefined {
  for (let size = 5n; ; size += 2n) {
    const d = (size & 2n) === 0n ? size : -size;
    const symbol = jacobi(d, n);
    if (symbol === -1) return d;
    if (symbol === 0 && gcd(d, n) !== n) return undefined;
    if (size === 13n && exactSquareRoot(n) !== undefined) return undefined;
  }
}
