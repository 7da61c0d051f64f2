import bigInt from 'big-integer';
import { unlimited, type Budget } from './budget';
import { trailingZeros } from './bits';
import { isStrongLucasProbablePrime } from './lucas';
import { powerModulo } from './modular';
import { seeded } from './seeded';
import { smallPrimeDivisors, smallPrimes, TRIAL_BOUND } from './small-primes';

/**
 * The least composite that passes the strong test to the first k primes as bases, k = 1, 2, …: C. Pomerance, J. Selfridge,
 * S. Wagstaff 1980; G. Jaeschke 1993; Y. Jiang, Y. Deng 2014; J. Sorenson, J. Webster, Strong pseudoprimes to twelve prime
 * bases, Math. Comp. 86 (2017), Theorem 1 (number from memory) for k = 12 and 13.
 */
const leastStrongPseudoprime: readonly bigint[] = [
  2047n,
  1373653n,
  25326001n,
  3215031751n,
  2152302898747n,
  3474749660383n,
  341550071728321n,
  341550071728321n,
  3825123056546413051n,
  3825123056546413051n,
  3825123056546413051n,
  318665857834031151167461n,
  3317044064679887385961981n,
];

/** From here on the further strong tests are left out: each would take as long as all the rest. */
const LONG = 1n << 2048n;

/**
 * Whether n is a prime number; false for n < 2.
 *
 * Proved for n < 3 317 044 064 679 887 385 961 981 (about 3.3·10^24): strong tests to as many prime bases as the table
 * above needs. Beyond, `false` is proved, and `true` means: n passed the test of Baillie, Pomerance, Selfridge and Wagstaff
 * (a strong test to base 2 and a strong Lucas test; R. Baillie, S. Wagstaff, Lucas pseudoprimes, Math. Comp. 35 (1980)) and
 * below 2^2048 four further strong tests. No composite is known to pass the first alone, but that none does is not proved.
 */
export function isPrime(n: bigint, budget: Budget = unlimited): boolean {
  if (n < 2n) return false;
  const divisors = smallPrimeDivisors(n);
  if (divisors.length > 0) return BigInt(divisors[0]!) === n;
  return n < BigInt(TRIAL_BOUND) ** 2n || isPrimeWithoutSmallFactor(n, budget);
}

/** As `isPrime`, for odd n > 2^24 that no prime below 2^12 divides. */
export function isPrimeWithoutSmallFactor(n: bigint, budget: Budget = unlimited): boolean {
  for (let k = 0; k < leastStrongPseudoprime.length; k++) {
    if (!isStrongProbablePrime(n, BigInt(smallPrimes[k]!), budget)) return false;
    if (n < leastStrongPseudoprime[k]!) return true;
    // The table is used up, or the number is beyond it: one base is then enough before the Lucas test.
    if (k === 0 && n >= leastStrongPseudoprime[leastStrongPseudoprime.length - 1]!) break;
  }
  if (!isStrongLucasProbablePrime(n, budget)) return false;
  return n >= LONG || bigInt(n).isProbablePrime(4, seeded(Number(n & 0x7fffffffn)));
}

/** The strong test (Miller, Rabin) of odd n > base ≥ 2: Cohen, Algorithm 8.2.2 (number from memory). */
export function isStrongProbablePrime(n: bigint, base: bigint, budget: Budget = unlimited): boolean {
  const spend = (): void => budget.spend('testing whether a number is prime');
  const twos = trailingZeros(n - 1n);
  let x = powerModulo(base, (n - 1n) >> BigInt(twos), n, spend);
  if (x === 1n || x === n - 1n) return true;
  for (let i = 1; i < twos; i++) {
    x = (x * x) % n;
    if (x === n - 1n) return true;
    if (x === 1n) return false;
  }
  return false;
}
