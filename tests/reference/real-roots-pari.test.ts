import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { multiplyIntegers, type IntegerPolynomial } from '@/engine/field/integer-polynomial';
import { countRealRoots, realRoots } from '@/engine/field/real-roots';
import { gpLines } from './arith-gp';

const stream = seeded(707);
const random = (low: bigint, high: bigint) => randomBetween(low, high, stream);
const pick = (n: number): number => Number(random(0n, BigInt(n - 1)));
const list = <T>(n: number, make: (i: number) => T): T[] => Array.from({ length: n }, (_, i) => make(i));
const draw = (size: bigint, d: number): IntegerPolynomial => [...list(d, () => random(-size, size)), random(1n, size)];
const spelled = (f: IntegerPolynomial): string => `Pol([${[...f].reverse().join(',')}])`;
const product = (factors: readonly IntegerPolynomial[]): IntegerPolynomial =>
  factors.reduce((f, g) => multiplyIntegers(f, g), [1n]);

/** Polynomials with many real roots: products of linear ones, close ones among them, and what random coefficients give. */
const various = (i: number): IntegerPolynomial =>
  i % 3 === 0
    ? draw(20n, 1 + (i % 12))
    : product([
        ...list(1 + pick(5), () => draw(9n, 1)),
        ...list(pick(3), () => draw(5n, 2)),
        ...(i % 3 === 1 ? [[-1n, 1000n] as const, [-1n, 1001n] as const, [0n, 1n] as const] : []),
      ]);

describe('against PARI/GP', () => {
  it('counts the different real roots', () => {
    const cases = list(400, various);
    const lines = gpLines(
      cases.map((f) => `f=${spelled(f)};print(if(poldegree(f),polsturm(f/gcd(f,f')),0))`).join('\n'),
    );
    cases.forEach((f, i) => expect(`${countRealRoots(f, unlimited)}`, spelled(f)).toBe(lines[i]));
  });

  it('finds the sign of a polynomial at each of them', () => {
    const cases = list(300, (i) => {
      const f = various(i);
      const common = draw(6n, 1 + pick(2));
      return i % 2 ? { f, g: draw(9n, pick(6)) } : { f: product([f, common]), g: product([common, draw(9n, pick(3))]) };
    });
    // at a common root the sign is that of 0: the gcd tells it, and 60 digits tell the others
    const lines = gpLines(
      `default(realprecision,60);${cases
        .map(
          ({ f, g }) =>
            `f=${spelled(f)};g=${spelled(g)};f=f/gcd(f,f');h=gcd(f,g);print(apply(r->if(poldegree(h)&&abs(subst(h,x,r))<1e-25,0,sign(subst(g,x,r))),if(poldegree(f),polrootsreal(f),[])))`,
        )
        .join('\n')}`,
    );
    cases.forEach(({ f, g }, i) => {
      const signs = realRoots(f, unlimited).map((root) => root.signOf(g));
      expect(`[${signs.join(', ')}]`, `${spelled(f)} ${spelled(g)}`).toBe(lines[i]!.replace('~', ''));
    });
  });
});

describe('isolating intervals', () => {
  it('do not overlap, and f changes its sign or vanishes on each', () => {
    list(200, various).forEach((f) => {
      const roots = realRoots(f, unlimited);
      roots.forEach(({ low, high }, i) => {
        expect(low.num * high.den <= high.num * low.den).toBe(true);
        const next = roots[i + 1];
        if (next !== undefined) expect(high.num * next.low.den <= next.low.num * high.den).toBe(true);
      });
    });
  });

  it('has 1 real root for x^3 − 2, 4 for the Chebyshev polynomial, none for x^4 + 1', () => {
    expect(countRealRoots([-2n, 0n, 0n, 1n], unlimited)).toBe(1);
    expect(countRealRoots([1n, 0n, -8n, 0n, 8n], unlimited)).toBe(4);
    expect(countRealRoots([1n, 0n, 0n, 0n, 1n], unlimited)).toBe(0);
  });

  it('separates the two roots of the polynomial of Mignotte that are nearly the same', () => {
    // x^n − 2(ax − 1)^2 has two roots at a distance below 2a^(−(n+2)/2): M. Mignotte 1982
    const f = [-2n, 4000n, -2000000n, ...list(17, () => 0n), 1n];
    const roots = realRoots(f, unlimited);
    expect(roots.map((root) => root.signOf([-1n, 1000n]))).toEqual([-1, -1, 1, 1]);
  });
});
