import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { coprimeOverFinite } from '@/engine/field/coprime-finite';
import { coprimeOverRationals } from '@/engine/field/coprime-rational';
import { factorOverFinite } from '@/engine/field/factor-finite';
import { factorOverRationals } from '@/engine/field/factor-rational';
import type { Field } from '@/engine/field/field';
import { finiteField } from '@/engine/field/finite';
import { degree, gcdPolynomials, monic, multiplyPolynomials, type Polynomial } from '@/engine/field/polynomial';
import { rational, rationals } from '@/engine/field/rational';

const stream = seeded(606);
const pick = (n: number): number => Number(randomBetween(0n, BigInt(n - 1), stream));
const list = <T>(n: number, make: (i: number) => T): T[] => Array.from({ length: n }, (_, i) => make(i));

interface Row<E> {
  readonly field: Field<E>;
  readonly element: () => E;
  readonly unit: () => E;
  readonly coprime: (list: readonly Polynomial<E>[]) => ReturnType<typeof coprimeOverFinite<E>>;
  readonly factors: (f: Polynomial<E>) => readonly { readonly factor: Polynomial<E>; readonly exponent: number }[];
}

const finite = (q: bigint): Row<unknown> => {
  const field = finiteField(q);
  return {
    field,
    element: () => field.element(randomBetween(0n, q - 1n, stream)),
    unit: () => field.element(randomBetween(1n, q - 1n, stream)),
    coprime: (polynomials) => coprimeOverFinite(field, polynomials, unlimited),
    factors: (f) => factorOverFinite(field, f, unlimited).factors,
  };
};

const overQ: Row<unknown> = {
  field: rationals as Field<unknown>,
  element: () => rational(BigInt(pick(19) - 9), BigInt(1 + pick(3))),
  unit: () => rational(BigInt(1 + pick(9)), BigInt(1 + pick(5))),
  coprime: (polynomials) => coprimeOverRationals(polynomials as never, unlimited) as never,
  factors: (f) => factorOverRationals(f as never, unlimited).factors,
};

const rows = [...[2n, 3n, 7n, 9n, 65537n, (1n << 61n) - 1n].map(finite), overQ];

describe.each(rows.map((row) => [row.field.name, row] as const))('a coprime base over %s', (_, row) => {
  const { field } = row;
  const product = (factors: readonly Polynomial<unknown>[]): Polynomial<unknown> =>
    factors.reduce((f, g) => multiplyPolynomials(field, f, g), [field.one]);
  const draw = (d: number): Polynomial<unknown> => [...list(d, row.element), row.unit()];

  it('is coprime, and every polynomial is a constant times the powers given', () => {
    for (let round = 0; round < 12; round++) {
      const atoms = list(8, () => draw(1 + pick(3)));
      const long = round % 6 === 5 ? [draw(70)] : [];
      const polynomials = [
        ...list(12, () => product(list(1 + pick(4), () => atoms[pick(8)]!))),
        ...long.flatMap((f) => [f, product([f, atoms[0]!]), product([f, f, atoms[1]!])]),
        [row.unit()],
      ];
      const { base, exponents } = row.coprime(polynomials);
      base.forEach((f, i) => {
        expect(degree(f)).toBeGreaterThan(0);
        base.slice(i + 1).forEach((g) => expect(degree(gcdPolynomials(field, f, g))).toBe(0));
        for (const { exponent } of row.factors(f)) expect(exponent).toBe(1);
      });
      polynomials.forEach((f, i) => {
        const back = product(exponents[i]!.flatMap(({ index, exponent }) => list(exponent, () => base[index]!)));
        expect(back).toEqual(monic(field, f));
      });
    }
  });

  it('does not depend on the order of the list', () => {
    const polynomials = list(10, () => product(list(1 + pick(3), () => draw(1 + pick(3)))));
    const sorted = row.coprime(polynomials);
    expect(row.coprime([...polynomials].reverse()).base).toEqual(sorted.base);
  });
});
