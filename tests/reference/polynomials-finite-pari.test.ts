import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import type { ExtensionField } from '@/engine/field/extension-field';
import { factorOverFinite } from '@/engine/field/factor-finite';
import { finiteField } from '@/engine/field/finite';
import { multiplyPolynomials, type Polynomial } from '@/engine/field/polynomial';
import { primeField } from '@/engine/field/prime-field';
import { gpLines } from './arith-gp';

const stream = seeded(404);
const random = (low: bigint, high: bigint) => randomBetween(low, high, stream);
const pick = (n: number): number => Number(random(0n, BigInt(n - 1)));
const list = <T>(n: number, make: (i: number) => T): T[] => Array.from({ length: n }, (_, i) => make(i));

/** Factors as one line: coefficients from the top, exponents, in the order the engine has. */
const line = (
  factors: readonly { readonly factor: readonly (bigint | string)[]; readonly exponent: number }[],
): string => factors.map(({ factor, exponent }) => `${[...factor].reverse().join(' ')} ^${exponent}`).join(', ');

const primes = [2n, 2n, 3n, 5n, 7n, 11n, 31n, 101n, 257n, 65537n, 33554393n, 33554467n, 1000000007n, 2147483647n];
const longer = [2147483659n, (1n << 61n) - 1n, (1n << 89n) - 1n];

describe('against PARI/GP', () => {
  const draw = (p: bigint, d: number): Polynomial<bigint> => [...list(d, () => random(0n, p - 1n)), random(1n, p - 1n)];
  const gp = (cases: readonly { p: bigint; f: Polynomial<bigint> }[]): string[] =>
    gpLines(
      cases
        .map(
          ({ p, f }) =>
            `M=factormod(Pol([${[...f].reverse().join(',')}]),${p});print(vector(#M~,i,[lift(Vec(M[i,1])),M[i,2]]))`,
        )
        .join('\n'),
    );
  /** What gp prints, in the engine's order. */
  const sorted = (printed: string): string => {
    const rows = [...printed.matchAll(/\[([^[\]]*)\], (\d+)\]/g)].map((match) => ({
      factor: match[1]!.split(', ').map(BigInt),
      exponent: Number(match[2]),
    }));
    rows.sort((a, b) => {
      if (a.factor.length !== b.factor.length) return a.factor.length - b.factor.length;
      const i = a.factor.findIndex((c, k) => c !== b.factor[k]);
      return a.factor[i]! < b.factor[i]! ? -1 : 1;
    });
    return line(rows.map(({ factor, exponent }) => ({ factor: factor.reverse(), exponent })));
  };

  it('factors random polynomials over prime fields in the same way', () => {
    const cases = [
      ...primes.flatMap((p) => list(60, (i) => ({ p, f: draw(p, 1 + (i % 25)) }))),
      ...primes.flatMap((p) => [40, 64, 90].map((d) => ({ p, f: draw(p, d) }))),
      ...longer.flatMap((p) => list(8, (i) => ({ p, f: draw(p, 2 + i) }))),
      { p: 2n, f: draw(2n, 700) },
      { p: 3n, f: draw(3n, 300) },
    ];
    const lines = gp(cases);
    cases.forEach(({ p, f }, i) => {
      const { unit, factors } = factorOverFinite(primeField(p), f, unlimited);
      expect(unit).toBe(f[f.length - 1]);
      expect(line(factors), `${f} mod ${p}`).toBe(sorted(lines[i]!));
    });
  });

  it('factors products with repeated factors, exponents past the characteristic among them', () => {
    const cases = primes.flatMap((p) =>
      list(25, () => {
        const field = primeField(p);
        let f: Polynomial<bigint> = [random(1n, p - 1n)];
        for (let k = 0; k < 4; k++) {
          const g = draw(p, 1 + pick(4));
          for (let e = 1 + pick(p < 8n ? 9 : 3); e > 0; e--) f = multiplyPolynomials(field, f, g);
        }
        return { p, f };
      }),
    );
    const lines = gp(cases);
    cases.forEach(({ p, f }, i) =>
      expect(line(factorOverFinite(primeField(p), f, unlimited).factors), `${f} mod ${p}`).toBe(sorted(lines[i]!)),
    );
  });

  it('factors over extensions, characteristic 2 among them', () => {
    const fields = [4n, 8n, 9n, 16n, 25n, 27n, 64n, 81n, 121n, 1024n, 10007n ** 2n, ((1n << 31n) - 1n) ** 3n].map(
      (q) => finiteField(q) as ExtensionField<bigint>,
    );
    const cases = fields.flatMap((field) =>
      list(12, (i) => {
        const element = () => field.element(random(0n, field.order - 1n));
        let f: Polynomial<Polynomial<bigint>> = [field.one];
        for (let k = 0; k < 3; k++) {
          const g = [...list(1 + ((i + k) % 4), element), field.one];
          for (let e = 1 + pick(3); e > 0; e--) f = multiplyPolynomials(field, f, g);
        }
        return { field, f };
      }),
    );
    // an element as the list of its coefficients from the constant term up
    const lines = gpLines(
      cases
        .map(({ field, f }) => {
          const text = (c: Polynomial<bigint>) => `(${c.map((a, i) => `${a}*z^${i}`).join('+') || '0'})`;
          const m = field.modulus.map((c, i) => `${c}*z^${i}`).join('+');
          return (
            `m=(${m})*Mod(1,${field.characteristic});g=ffgen(m,'z);` +
            `f=subst(Pol([${[...f].reverse().map(text).join(',')}],'x),'z,g);M=factor(f);d=${field.modulus.length - 1};` +
            `print(vector(#M~,i,[[Vecrev(Pol(polcoef(M[i,1],k).pol,'z),d)|k<-[0..poldegree(M[i,1])]],M[i,2]]))`
          );
        })
        .join('\n'),
    );
    cases.forEach(({ field, f }, i) => {
      const d = field.modulus.length - 1;
      const rows = factorOverFinite(field, f, unlimited).factors.map(
        ({ factor, exponent }) =>
          `[[${factor.map((c) => `[${list(d, (k) => c[k] ?? 0n).join(', ')}]`).join(', ')}], ${exponent}]`,
      );
      const theirs = lines[i]!.slice(1, -1).split(/, (?=\[\[\[)/);
      expect([...rows].sort()).toEqual([...theirs].sort());
    });
  });
});
