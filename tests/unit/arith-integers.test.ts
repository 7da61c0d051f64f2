import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bitLength, trailingZeros } from '@/engine/arith/bits';
import { gcd } from '@/engine/arith/gcd';
import { jacobi } from '@/engine/arith/jacobi';
import { inverseModulo, modulo, powerModulo } from '@/engine/arith/modular';
import { perfectPower } from '@/engine/arith/perfect-power';
import { productOf, productTree, remainders } from '@/engine/arith/product-tree';
import { exactSquareRoot, integerRoot } from '@/engine/arith/roots';
import { valuation } from '@/engine/arith/valuation';

const integer = (bits: number) => fc.bigInt({ min: -(1n << BigInt(bits)), max: 1n << BigInt(bits) });
const natural = (bits: number) => fc.bigInt({ min: 0n, max: 1n << BigInt(bits) });
/** Short and long numbers alike, so that every road is taken: numbers, words, leading halves. */
const anySize = fc.oneof(integer(20), integer(52), integer(80), integer(700), integer(4000));

const euclid = (a: bigint, b: bigint): bigint => (b === 0n ? (a < 0n ? -a : a) : euclid(b, a % b));

describe('lengths', () => {
  it('counts binary digits as writing in base 2 does', () => {
    fc.assert(fc.property(anySize, (n) => bitLength(n) === (n === 0n ? 0 : (n < 0n ? -n : n).toString(2).length)));
    for (const k of [31n, 32n, 33n, 52n, 53n, 54n, 64n]) {
      expect(bitLength(1n << k)).toBe(Number(k) + 1);
      expect(bitLength((1n << k) - 1n)).toBe(Number(k));
    }
  });

  it('counts zeros at the end', () => {
    fc.assert(
      fc.property(
        integer(80).filter((n) => n % 2n !== 0n),
        fc.nat(400),
        (odd, k) => trailingZeros(odd << BigInt(k)) === k,
      ),
    );
  });
});

describe('greatest common divisor', () => {
  it('agrees with the Euclidean algorithm', () => {
    fc.assert(fc.property(anySize, anySize, integer(900), (a, b, c) => gcd(a * c, b * c) === euclid(a * c, b * c)));
  });

  it('meets the worst case of consecutive Fibonacci numbers', () => {
    let [a, b] = [0n, 1n];
    for (let i = 0; i < 5000; i++) [a, b] = [b, a + b];
    expect(gcd(a, b)).toBe(1n);
    expect(gcd(a * 12n, b * 18n)).toBe(euclid(a * 12n, b * 18n));
  });

  it('takes zero and signs', () => {
    expect([gcd(0n, 0n), gcd(0n, -7n), gcd(-12n, 18n), gcd(1n << 900n, 0n)]).toEqual([0n, 7n, 6n, 1n << 900n]);
  });
});

describe('residues', () => {
  it('inverts exactly the units', () => {
    fc.assert(
      fc.property(anySize, fc.oneof(natural(25), natural(300)), (a, m0) => {
        const m = m0 + 1n;
        if (euclid(a, m) !== 1n) {
          expect(() => inverseModulo(a, m)).toThrow(RangeError);
          return;
        }
        const inverse = inverseModulo(a, m);
        expect(inverse >= 0n && inverse < m).toBe(true);
        expect(modulo(a * inverse, m)).toBe(modulo(1n, m));
      }),
    );
  });

  it('raises to powers as repeated multiplication does', () => {
    fc.assert(
      fc.property(integer(60), fc.nat(300), fc.oneof(natural(25), natural(90)), (b, e, m) => {
        expect(powerModulo(b, BigInt(e), m + 1n)).toBe(modulo(b ** BigInt(e), m + 1n));
      }),
    );
  });

  it('adds long exponents, negative ones too', () => {
    const m = (1n << 127n) - 1n;
    fc.assert(
      fc.property(fc.bigInt({ min: 1n, max: m - 1n }), integer(400), integer(400), (b, e, f) => {
        expect(modulo(powerModulo(b, e, m) * powerModulo(b, f, m), m)).toBe(powerModulo(b, e + f, m));
      }),
    );
    expect(powerModulo(3n, 1n << 80n, 1000003n)).toBe(powerModulo(3n, (1n << 80n) % 1000002n, 1000003n));
    expect([powerModulo(0n, 0n, 7n), powerModulo(5n, 0n, 1n)]).toEqual([1n, 0n]);
    expect(() => powerModulo(0n, -1n, 7n)).toThrow(RangeError);
  });
});

describe('Jacobi symbol', () => {
  it('is the Legendre symbol at primes', () => {
    for (const p of [3n, 5n, 7n, 11n, 13n, 101n, 1000003n, (1n << 61n) - 1n, (1n << 89n) - 1n]) {
      for (let a = -20n; a <= 20n; a++) {
        const power = powerModulo(a, (p - 1n) / 2n, p);
        expect(BigInt(jacobi(a, p))).toBe(power === p - 1n ? -1n : power);
      }
    }
  });

  it('is multiplicative above and below', () => {
    const odd = fc.oneof(natural(30), natural(200)).map((n) => 2n * n + 1n);
    fc.assert(
      fc.property(anySize, anySize, odd, odd, (a, b, m, n) => {
        expect(jacobi(a, m) * jacobi(b, m) === jacobi(a * b, m)).toBe(true);
        expect(jacobi(a, m) * jacobi(a, n) === jacobi(a, m * n)).toBe(true);
      }),
    );
  });

  it('refuses even and negative moduli', () => {
    expect(() => jacobi(1n, 8n)).toThrow(RangeError);
    expect(() => jacobi(1n, -3n)).toThrow(RangeError);
  });
});

describe('valuation', () => {
  it('takes all of p out and keeps the sign', () => {
    const prime = fc.constantFrom(2n, 3n, 7n, 65537n, (1n << 61n) - 1n);
    fc.assert(
      fc.property(prime, fc.nat(300), integer(70), (p, exponent, n) => {
        fc.pre(n % p !== 0n);
        expect(valuation(n * p ** BigInt(exponent), p)).toEqual({ exponent, unit: n });
      }),
    );
    expect(valuation(-2n * 7n ** 10000n, 7n)).toEqual({ exponent: 10000, unit: -2n });
    expect(() => valuation(0n, 5n)).toThrow(RangeError);
  });
});

describe('roots and powers', () => {
  it('rounds roots down', () => {
    fc.assert(
      fc.property(fc.oneof(natural(20), natural(53), natural(3000)), fc.integer({ min: 1, max: 40 }), (n, k) => {
        const root = integerRoot(n, k);
        expect(root ** BigInt(k) <= n && n < (root + 1n) ** BigInt(k)).toBe(true);
      }),
    );
  });

  it('recognises squares and nothing else', () => {
    fc.assert(
      fc.property(fc.oneof(natural(20), natural(400)), (n) => {
        expect(exactSquareRoot(n * n)).toBe(n);
        expect(exactSquareRoot(n * n + 1n)).toBe(n === 0n ? 1n : undefined);
      }),
    );
  });

  it('finds the largest exponent', () => {
    fc.assert(
      fc.property(fc.bigInt({ min: 2n, max: 1n << 40n }), fc.integer({ min: 1, max: 60 }), (n, k) => {
        const whole = perfectPower(n ** BigInt(k));
        expect(whole.root ** BigInt(whole.exponent)).toBe(n ** BigInt(k));
        expect(whole.exponent % k).toBe(0);
        expect(perfectPower(whole.root).exponent).toBe(1);
      }),
    );
    expect(perfectPower(1n)).toEqual({ root: 1n, exponent: 1 });
    expect(perfectPower(6n ** 5003n)).toEqual({ root: 6n, exponent: 5003 });
  });
});

describe('product and remainder trees', () => {
  it('multiply, and give all remainders at once', () => {
    fc.assert(
      fc.property(
        fc.array(
          natural(60).map((n) => n + 1n),
          { minLength: 1, maxLength: 40 },
        ),
        natural(3000),
        (list, value) => {
          expect(productOf(list)).toBe(list.reduce((a, b) => a * b, 1n));
          expect(remainders(value, productTree(list))).toEqual(list.map((n) => value % n));
        },
      ),
    );
    expect(productOf([])).toBe(1n);
  });
});
