/** Primes below this bound are found by trial division. */
export const TRIAL_BOUND = 4096;

/** The primes below `bound`, ascending, by the sieve of Eratosthenes. */
export function primesBelow(bound: number): Uint32Array {
  const composite = new Uint8Array(bound);
  const primes: number[] = [];
  for (let p = 2; p < bound; p++) {
    if (composite[p]) continue;
    primes.push(p);
    for (let multiple = p * p; multiple < bound; multiple += p) composite[multiple] = 1;
  }
  return Uint32Array.from(primes);
}

/** The 564 primes below 2^12. */
export const smallPrimes: Uint32Array = primesBelow(TRIAL_BOUND);

/** Consecutive small primes whose product is below 2^53, so that one long remainder serves several primes. */
interface Bundle {
  readonly product: number;
  readonly primes: readonly number[];
}

const bundles: readonly Bundle[] = (() => {
  const made: Bundle[] = [];
  let primes: number[] = [];
  let product = 1;
  for (const p of smallPrimes) {
    if (product * p >= 2 ** 53) {
      made.push({ product, primes });
      primes = [];
      product = 1;
    }
    primes.push(p);
    product *= p;
  }
  made.push({ product, primes });
  return made;
})();

/** Bundles in groups: a long number is reduced once modulo the product of a group, then modulo each bundle. */
const groups: readonly { readonly product: bigint; readonly bundles: readonly Bundle[] }[] = (() => {
  const size = 16;
  const made = [];
  for (let i = 0; i < bundles.length; i += size) {
    const part = bundles.slice(i, i + size);
    made.push({ product: part.reduce((whole, bundle) => whole * BigInt(bundle.product), 1n), bundles: part });
  }
  return made;
})();

/** 2^26 modulo each small prime: a number below 2^53 is taken in two halves, so that all remainders are of short integers. */
const halfWord = 67108864;
const halfWordModulo: Uint32Array = smallPrimes.map((p) => halfWord % p);

/** The primes below 2^12 that divide n ≥ 1, ascending. */
export function smallPrimeDivisors(n: bigint): number[] {
  if (n < 9007199254740992n) return divisorsOfSmall(Number(n));
  const found: number[] = [];
  let at = 0;
  for (const group of groups) {
    const rest = n % group.product;
    for (const bundle of group.bundles) {
      const residue = Number(rest % BigInt(bundle.product));
      const low = (residue % halfWord) | 0;
      const high = ((residue - low) / halfWord) | 0;
      for (let end = at + bundle.primes.length; at < end; at++) {
        const p = smallPrimes[at]!;
        if ((((high % p) * halfWordModulo[at]! + low) | 0) % p === 0) found.push(p);
      }
    }
  }
  return found;
}

function divisorsOfSmall(n: number): number[] {
  const found: number[] = [];
  let rest = n;
  let low = (rest % halfWord) | 0;
  let high = ((rest - low) / halfWord) | 0;
  for (let at = 0; at < smallPrimes.length; at++) {
    const p = smallPrimes[at]!;
    if (high === 0 && p * p > low) break;
    if ((((high % p) * halfWordModulo[at]! + low) | 0) % p !== 0) continue;
    found.push(p);
    do rest /= p;
    while (rest % p === 0);
    low = (rest % halfWord) | 0;
    high = ((rest - low) / halfWord) | 0;
  }
  if (rest > 1 && rest < TRIAL_BOUND) found.push(rest);
  return found;
}
