import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { elementText } from '@/engine/expression/to-text';
import type { ExtensionField } from '@/engine/field/extension-field';
import { finiteField } from '@/engine/field/finite';
import { leastFactor } from '@/engine/field/irreducible';
import { degree, resultant, valueAt, type Polynomial } from '@/engine/field/polynomial';
import { primeField } from '@/engine/field/prime-field';
import { resolveFiniteField } from '@/engine/field/resolve-finite';
import { readFieldName } from '@/grammar/read';
import { gpLines } from './arith-gp';

const stream = seeded(77);
const random = (low: bigint, high: bigint) => randomBetween(low, high, stream);
const draw = (p: bigint, d: number): Polynomial<bigint> => [...Array.from({ length: d }, () => random(0n, p - 1n)), 1n];
/** A polynomial as gp reads it. */
const spelled = (f: Polynomial<bigint>, letter: string): string =>
  f.map((c, i) => `${c}*${letter}^${i}`).join('+') || '0';

const primes = [2n, 3n, 5n, 7n, 11n, 101n, 65537n, 1000003n, (1n << 61n) - 1n, (1n << 89n) - 1n];

describe('against PARI/GP', () => {
  it('calls the same polynomials irreducible and finds a least factor of the same degree', () => {
    const cases = primes.flatMap((p) => Array.from({ length: 40 }, (_, i) => ({ p, f: draw(p, 1 + (i % 8)) })));
    const lines = gpLines(
      cases
        .map(
          ({ p, f }) =>
            `f=(${spelled(f, 'x')})*Mod(1,${p});print([polisirreducible(f),vecmin(apply(poldegree,factor(f)[,1]))])`,
        )
        .join('\n'),
    );
    cases.forEach(({ p, f }, i) => {
      const factor = leastFactor(primeField(p), f, unlimited, '');
      expect(`[${factor ? 0 : 1}, ${degree(factor ?? f)}]`, `${spelled(f, 'x')} mod ${p}`).toBe(lines[i]);
    });
    expect(lines.filter((line) => line.startsWith('[1')).length).toBeGreaterThan(60);
  });

  it('names the least root', () => {
    const cases = primes.slice(3).flatMap((p) => Array.from({ length: 20 }, () => ({ p, f: draw(p, 3) })));
    const lines = gpLines(
      cases.map(({ p, f }) => `r=lift(polrootsmod(${spelled(f, 'x')},${p}));print(if(#r,vecmin(r),-1))`).join('\n'),
    );
    let rooted = 0;
    cases.forEach(({ p, f }, i) => {
      const field = primeField(p);
      const factor = leastFactor(field, f, unlimited, '');
      const root = factor && degree(factor) === 1 ? field.negate(factor[0]!) : -1n;
      if (root >= 0n) {
        rooted++;
        expect(valueAt(field, f, root)).toBe(0n);
      }
      expect(`${root}`).toBe(lines[i]);
    });
    expect(rooted).toBeGreaterThan(40);
  });

  it('multiplies, inverts, and tells squares in the same way', () => {
    const fields = [4n, 8n, 9n, 25n, 27n, 81n, 343n, 1024n, 101n ** 5n, ((1n << 61n) - 1n) ** 2n].map(
      (q) => finiteField(q) as ExtensionField<bigint>,
    );
    const cases = fields.flatMap((field) =>
      Array.from({ length: 40 }, () => ({
        field,
        a: field.element(random(1n, field.order - 1n)),
        b: field.element(random(0n, field.order - 1n)),
      })),
    );
    const coefficients = 'v(w,d)=my(c=w.pol);vector(d,i,polcoef(c,i-1));\n';
    const lines = gpLines(
      coefficients +
        cases
          .map(({ field, a, b }) => {
            const p = field.characteristic;
            const d = degree(field.modulus);
            return `t=ffgen((${spelled(field.modulus, 'z')})*Mod(1,${p}),'z);a=subst(${spelled(a, 'x')},x,t);b=subst(${spelled(b, 'x')},x,t);\
print([v(a*b,${d}),v(b/a,${d}),v(a^${p + 2n},${d}),issquare(a),norm(a)])`;
          })
          .join('\n'),
    );
    cases.forEach(({ field, a, b }, i) => {
      const d = degree(field.modulus);
      const padded = (f: Polynomial<bigint>) => `[${Array.from({ length: d }, (_, k) => f[k] ?? 0n).join(', ')}]`;
      const norm = resultant(field.base, field.modulus, a);
      const values = [
        padded(field.multiply(a, b)),
        padded(field.multiply(b, field.inverse(a))),
        padded(field.power(a, field.characteristic + 2n)),
        field.isSquare(a) ? 1 : 0,
        `Mod(${norm}, ${field.characteristic})`,
      ];
      expect(`[${values.join(', ')}]`, `${elementText(field.write(a))} in ${field.name}`).toBe(lines[i]);
    });
  });

  it('accepts a tower exactly when its modulus is irreducible over the field below', () => {
    const base = finiteField(9n) as ExtensionField<bigint>;
    const all = Array.from(
      { length: 81 },
      (_, i) => [base.element(BigInt(i % 9)), base.element(BigInt((i - (i % 9)) / 9))] as const,
    );
    const lines = gpLines(
      `t=ffgen((z^2+1)*Mod(1,3),'z);\n${all
        .map(([c, b]) => `print(polisirreducible(y^2+y*subst(${spelled(b, 'x')},x,t)+subst(${spelled(c, 'x')},x,t)))`)
        .join('\n')}`,
    );
    all.forEach(([c, b], i) => {
      const name = `F_9[y]/(y^2+(${elementText(base.write(b))})*y+${elementText(base.write(c))})`;
      let accepted = '1';
      try {
        resolveFiniteField(readFieldName(name), unlimited);
      } catch {
        accepted = '0';
      }
      expect(accepted, name).toBe(lines[i]);
    });
    expect(lines.filter((line) => line === '1').length).toBe(36); // (q² − q)/2 monic irreducible quadratics, q = 9
  });
});
