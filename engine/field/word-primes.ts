import { isPrime } from '../arith/prime';
import { smallPrimes } from '../arith/small-primes';

/** Below this, three products of residues can be added exactly as numbers. */
const TOP = 2 ** 25;

const found: number[] = [];

/** The primes below 2^25 in descending order, by their place 0, 1, …; more than two million, made as they are asked for. */
export function wordPrime(place: number): number {
  let next = (found[found.length - 1] ?? TOP + 1) - 2;
  for (; found.length <= place; next -= 2) if (isPrime(BigInt(next))) found.push(next);
  return found[place]!;
}

/** Small primes to factor modulo, ascending from 61, and then the primes below 2^25. */
export function* trialPrimes(): Generator<number> {
  for (const p of smallPrimes) if (p > 60) yield p;
  for (let place = 0; ; place++) yield wordPrime(place);
}
