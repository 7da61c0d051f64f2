import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { factor } from '@/engine/arith/factor';
import { gcd } from '@/engine/arith/gcd';
import { jacobi } from '@/engine/arith/jacobi';
import { inverseModulo } from '@/engine/arith/modular';
import { perfectPower } from '@/engine/arith/perfect-power';
import { isPrime } from '@/engine/arith/prime';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { valuation } from '@/engine/arith/valuation';
import { gpLines, gpVector } from './arith-gp';

const stream = seeded(20260101);
const below = (bits: number) => randomBetween(1n, 1n << BigInt(bits), stream);
const list = (count: number, make: (i: number) => bigint) => Array.from({ length: count }, (_, i) => make(i));

describe('against PARI/GP', () => {
  it('factors the same numbers into the same primes', () => {
    const numbers = [
      ...list(600, (i) => below(10 + (i % 80))),
      ...list(60, () => below(30) * below(45) * below(20)),
      ...list(40, () => below(20) ** 3n * below(16) ** 2n),
      ...list(20, () => below(110)),
    ];
    const lines = gpLines(`${gpVector('v', numbers)}\nfor(i=1,#v,print(factor(v[i])~))`);
    expect(lines.length).toBe(numbers.length);
    numbers.forEach((n, i) => {
      const factors = factor(n, unlimited);
      const text =
        n === 1n ? '[;]' : `[${factors.map((f) => f.prime).join(', ')}; ${factors.map((f) => f.exponent).join(', ')}]`;
      expect(lines[i], `${n}`).toBe(n === 1n ? 'matrix(2,0)' : text);
    });
  });

  it('agrees on primality around random numbers and powers of 2', () => {
    const numbers = [
      ...list(2000, (i) => below(5 + (i % 120)) | 1n),
      ...list(600, (i) => (1n << BigInt(20 + (i % 100))) + BigInt(i) - 300n),
      ...list(60, () => below(600) | 1n),
    ];
    const lines = gpLines(`${gpVector('v', numbers)}\nfor(i=1,#v,print(ispseudoprime(v[i])))`);
    numbers.forEach((n, i) => expect(isPrime(n), `${n}`).toBe(lines[i] === '1'));
    expect(lines.filter((line) => line === '1').length).toBeGreaterThan(50);
  });

  it('agrees on Jacobi symbols, inverses, greatest common divisors and valuations', () => {
    const pairs = list(1500, (i) => below(10 + (i % 150))).map(
      (a, i) => [i % 2 ? -a : a, below(10 + (i % 130)) | 1n] as const,
    );
    const lines = gpLines(
      `${gpVector(
        'v',
        pairs.map(([a, n]) => `[${a},${n}]`),
      )}
for(i=1,#v,my(a=v[i][1],n=v[i][2],g=gcd(a,n));print([kronecker(a,n),g,if(g==1,lift(Mod(a,n)^-1),-1),valuation(a*n^3,3),if(a>0,ispower(a^6),0)]))`,
    );
    pairs.forEach(([a, n], i) => {
      const common = gcd(a, n);
      const inverse = common === 1n ? inverseModulo(a, n) : -1n;
      const power = a > 1n ? perfectPower(a ** 6n).exponent : 0;
      const values = [jacobi(a, n), common, inverse, valuation(a * n ** 3n, 3n).exponent, power];
      expect(lines[i], `${a}, ${n}`).toBe(`[${values.join(', ')}]`);
    });
  });

  it('takes the greatest common divisor of numbers of ten thousand digits', () => {
    const triples = list(6, () => below(33000)).map(
      (a, i) => [a * 7n ** BigInt(i), below(33000), below(3000)] as const,
    );
    const lines = gpLines(triples.map(([a, b, c]) => `print(gcd(${a}*${c},${b}*${c}))`).join('\n'));
    triples.forEach(([a, b, c], i) => expect(gcd(a * c, b * c).toString()).toBe(lines[i]));
  });
});
