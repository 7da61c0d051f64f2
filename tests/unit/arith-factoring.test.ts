import bigInt from 'big-integer';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { coprimeBase } from '@/engine/arith/coprime-base';
import { ellipticCurves } from '@/engine/arith/elliptic-curves';
import { factor } from '@/engine/arith/factor';
import { gcd } from '@/engine/arith/gcd';
import { isPrime } from '@/engine/arith/prime';
import { quadraticSieve } from '@/engine/arith/quadratic-sieve/quadratic-sieve';
import { rho } from '@/engine/arith/rho';
import { primesBelow, smallPrimeDivisors, smallPrimes } from '@/engine/arith/small-primes';

const nextPrime = (from: bigint): bigint => {
  let n = from;
  while (!isPrime(n)) n++;
  return n;
};
const prime = (digits: number) =>
  fc.bigInt({ min: 10n ** BigInt(digits - 1), max: 10n ** BigInt(digits) - 1n }).map(nextPrime);

describe('primality', () => {
  it('agrees with the sieve below 100000', () => {
    const primes = new Set(primesBelow(100000));
    for (let n = -5; n < 100000; n++) if (isPrime(BigInt(n)) !== primes.has(n)) throw new Error(`wrong at ${n}`);
    expect(primes.size).toBe(9592); // π(10^5), e.g. H. Riesel, Prime Numbers and Computer Methods for Factorization, table 3
  });

  it('sees through Carmichael numbers and strong pseudoprimes', () => {
    // The least strong pseudoprimes to the first k prime bases: J. Sorenson, J. Webster, Math. Comp. 86 (2017), table 1.
    const strong = [
      2047n,
      1373653n,
      25326001n,
      3215031751n,
      2152302898747n,
      3474749660383n,
      341550071728321n,
      3825123056546413051n,
      318665857834031151167461n,
      3317044064679887385961981n,
    ];
    const carmichael = [561n, 1105n, 1729n, 2465n, 6601n, 825265n, 9746347772161n];
    for (const n of [...strong, ...carmichael]) expect(isPrime(n), `${n}`).toBe(false);
  });

  it('knows Mersenne primes and their neighbours', () => {
    // Exponents of the Mersenne primes below 1300: R. Robinson, Proc. AMS 5 (1954), and earlier work.
    const exponents = [2, 3, 5, 7, 13, 17, 19, 31, 61, 89, 107, 127, 521, 607, 1279];
    for (const p of primesBelow(300)) expect(isPrime(2n ** BigInt(p) - 1n), `2^${p}-1`).toBe(exponents.includes(p));
    for (const p of [521, 607, 1279]) expect(isPrime(2n ** BigInt(p) - 1n)).toBe(true);
  });

  it('refuses squares and products beyond the proved range', () => {
    const p = nextPrime(10n ** 30n);
    const q = nextPrime(10n ** 31n);
    expect([isPrime(p), isPrime(q), isPrime(p * p), isPrime(p * q), isPrime(p ** 3n)]).toEqual([
      true,
      true,
      false,
      false,
      false,
    ]);
  });

  it('agrees with another implementation', () => {
    fc.assert(
      fc.property(fc.bigInt({ min: 0n, max: 1n << 64n }), (n) => {
        expect(isPrime(n)).toBe(bigInt(n).isPrime());
        expect(isPrime(nextPrime(n))).toBe(bigInt(nextPrime(n)).isPrime());
      }),
      { numRuns: 60 },
    );
  });
});

describe('factoring', () => {
  const multiplied = (n: bigint) =>
    factor(n, unlimited).reduce((value, f) => value * f.prime ** BigInt(f.exponent), 1n);

  it('multiplies back, into primes, ascending', () => {
    fc.assert(
      fc.property(fc.bigInt({ min: -(1n << 70n), max: 1n << 70n }), (n) => {
        fc.pre(n !== 0n);
        const factors = factor(n, unlimited);
        expect(multiplied(n)).toBe(n < 0n ? -n : n);
        factors.forEach(({ prime, exponent }, i) => {
          expect(isPrime(prime) && exponent > 0).toBe(true);
          if (i > 0) expect(factors[i - 1]!.prime < prime).toBe(true);
        });
      }),
    );
  });

  it('gathers powers of small, middle and long primes', () => {
    fc.assert(
      fc.property(
        prime(2),
        prime(5),
        prime(9),
        prime(30),
        fc.array(fc.integer({ min: 1, max: 5 }), { minLength: 4, maxLength: 4 }),
        (p, q, r, s, e) => {
          const n = p ** BigInt(e[0]!) * q ** BigInt(e[1]!) * r ** BigInt(e[2]!) * s ** BigInt(e[3]!);
          expect(factor(n, unlimited)).toEqual([p, q, r, s].map((x, i) => ({ prime: x, exponent: e[i] })));
        },
      ),
      { numRuns: 15 },
    );
  });

  it('splits products of two primes of 15 and of 20 digits', () => {
    for (const [p, q] of [
      [nextPrime(10n ** 14n), nextPrime(7n * 10n ** 14n)],
      [nextPrime(10n ** 19n), nextPrime(7n * 10n ** 19n)],
    ] as const) {
      expect(factor(p * q, unlimited)).toEqual([
        { prime: p, exponent: 1 },
        { prime: q, exponent: 1 },
      ]);
    }
  });

  it('finds published factorisations', () => {
    // J. Brillhart, D. Lehmer, J. Selfridge, B. Tuckerman, S. Wagstaff, Factorizations of bⁿ ± 1 (1988), table 2−.
    expect(factor(2n ** 67n - 1n, unlimited).map((f) => f.prime)).toEqual([193707721n, 761838257287n]);
    expect(factor(2n ** 101n - 1n, unlimited).map((f) => f.prime)).toEqual([7432339208719n, 341117531003194129n]);
    // The sixth Fermat number: F. Landry 1880.
    expect(factor(2n ** 64n + 1n, unlimited).map((f) => f.prime)).toEqual([274177n, 67280421310721n]);
  });

  it('knows that 1 has no prime factor and 0 no factorisation', () => {
    expect(factor(1n, unlimited)).toEqual([]);
    expect(factor(-1n, unlimited)).toEqual([]);
    expect(() => factor(0n, unlimited)).toThrow(RangeError);
  });

  it('can be stopped, and says what it was doing', () => {
    const n = nextPrime(10n ** 50n) * nextPrime(3n * 10n ** 50n);
    let calls = 0;
    const budget = {
      spend(doing: string) {
        if (++calls > 50) throw new Error(`stopped while ${doing}`);
      },
    };
    expect(() => factor(n, budget)).toThrow('stopped while factoring a number of 101 digits');
    expect(calls).toBe(51);
  });
});

describe('the methods one by one', () => {
  const divides = (d: bigint | undefined, n: bigint) => d !== undefined && d > 1n && d < n && n % d === 0n;

  it('rho finds factors of six digits', () => {
    fc.assert(
      fc.property(prime(6), prime(12), (p, q) => divides(rho(p * q, 1e9, unlimited, ''), p * q)),
      { numRuns: 20 },
    );
  });

  it('rho splits squares of primes or gives up within its steps', () => {
    const p = nextPrime(5000n);
    expect(divides(rho(p * p, 1e6, unlimited, ''), p * p)).toBe(true);
    expect(rho(nextPrime(10n ** 20n) * nextPrime(10n ** 21n), 1000, unlimited, '')).toBeUndefined();
  });

  it('elliptic curves find a factor of ten digits in a long number', () => {
    fc.assert(
      fc.property(prime(10), prime(40), (p, q) => divides(ellipticCurves(p * q, 1000, 200, unlimited, ''), p * q)),
      { numRuns: 5 },
    );
  });

  it('the quadratic sieve splits products of two primes alike, from 15 to 36 digits', () => {
    for (let digits = 8; digits <= 18; digits++) {
      fc.assert(
        fc.property(prime(digits), prime(digits), (p, q) => {
          fc.pre(p !== q);
          return divides(quadraticSieve(p * q, unlimited, ''), p * q);
        }),
        { numRuns: 3 },
      );
    }
  });

  it('the quadratic sieve ends on short numbers too, where polynomials are few', () => {
    for (const digits of [7, 8, 9, 10, 12]) {
      fc.assert(
        fc.property(prime(digits), prime(digits), (p, q) => {
          fc.pre(p !== q);
          const divisor = quadraticSieve(p * q, unlimited, '');
          return divisor === undefined || divides(divisor, p * q);
        }),
        { numRuns: 30 },
      );
    }
    expect(divides(quadraticSieve(494918322905185120337659n, unlimited, ''), 494918322905185120337659n)).toBe(true);
  });

  it('trial division lists the small primes that divide', () => {
    fc.assert(
      fc.property(fc.oneof(fc.bigInt({ min: 1n, max: 1n << 50n }), fc.bigInt({ min: 1n, max: 1n << 900n })), (n) => {
        expect(smallPrimeDivisors(n)).toEqual([...smallPrimes].filter((p) => n % BigInt(p) === 0n));
      }),
      { numRuns: 40 },
    );
  });
});

describe('coprime bases', () => {
  const checked = (list: readonly bigint[]) => {
    const base = coprimeBase(list);
    base.forEach((b, i) => {
      expect(b > 1n).toBe(true);
      if (i > 0) expect(base[i - 1]! < b).toBe(true);
      for (const c of base.slice(0, i)) expect(gcd(b, c)).toBe(1n);
    });
    for (const n of list) {
      let rest = n < 0n ? -n : n;
      for (const b of base) while (rest % b === 0n) rest /= b;
      expect(rest).toBe(1n);
    }
    return base;
  };
  const middle = fc.constantFrom(...primesBelow(4400).slice(564)).map(BigInt);
  const smooth = fc.array(middle, { minLength: 1, maxLength: 8 }).map((factors) => factors.reduce((a, b) => a * b, 1n));

  it('are coprime and generate, whatever is shared', () => {
    fc.assert(fc.property(fc.array(smooth, { maxLength: 60 }), (list) => void checked(list)));
    fc.assert(
      fc.property(fc.array(fc.bigInt({ min: 1n, max: 1n << 90n }), { maxLength: 40 }), (list) => void checked(list)),
    );
  });

  it('depend only on the set of the sizes', () => {
    fc.assert(
      fc.property(fc.array(smooth, { maxLength: 30 }), (list) => {
        expect(coprimeBase([...list, ...list].reverse().map((n) => -n))).toEqual(coprimeBase(list));
      }),
    );
  });

  it('take small primes apart and keep long factors whole when nothing separates them', () => {
    const [p, q, r] = [10007n, 10009n, 10037n];
    expect(checked([12n, -18n, p * p * q])).toEqual([2n, 3n, p * p * q]);
    expect(checked([p * p * q, q ** 3n])).toEqual([q, p * p]);
    expect(checked([p ** 4n, p ** 6n])).toEqual([p * p]);
    expect(checked([p * q, q * r, r * p])).toEqual([p, q, r]);
    expect(checked([1n, -1n])).toEqual([]);
    expect(() => coprimeBase([2n, 0n])).toThrow(RangeError);
  });
});
