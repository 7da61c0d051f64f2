import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { extensionField } from '@/engine/field/extension-field';
import type { Field, FiniteField } from '@/engine/field/field';
import { finiteField } from '@/engine/field/finite';
import { leastIrreducible } from '@/engine/field/least-irreducible';
import { primeField } from '@/engine/field/prime-field';
import { rational, rationals } from '@/engine/field/rational';
import { readElement } from '@/engine/field/read-element';
import { elementText } from '@/engine/expression/to-text';
import { unlimited } from '@/engine/arith/budget';
import { readElement as readText } from '@/grammar/read';

/** A row is a field and how to draw its elements: that is all a new field needs here. */
interface Row<E> {
  readonly field: Field<E>;
  readonly elements: fc.Arbitrary<E>;
}

const finite = <E>(field: FiniteField<E>): Row<E> => ({
  field,
  elements: fc
    .oneof(
      fc.bigInt({ min: 0n, max: field.order - 1n }),
      fc.bigInt({ min: 0n, max: field.order < 6n ? field.order - 1n : 5n }),
    )
    .map((index) => field.element(index)),
});

const f9 = extensionField(primeField(3n), 'z', [1n, 0n, 1n]);
const f81 = extensionField(f9, 'y', [f9.element(4n), [], f9.one]);
const long = 1_000_000_000_000_000_000_000_000_000_000_000_000_000_000_000_000_000_000_000_007n;

const finiteFields: readonly FiniteField<unknown>[] = [
  ...[2n, 3n, 5n, 7n, 65537n, 1000003n, (1n << 61n) - 1n, long].map((p) => primeField(p)),
  ...[4n, 8n, 9n, 16n, 25n, 27n, 49n, 81n, 125n, 243n, 1024n, 101n ** 6n, ((1n << 61n) - 1n) ** 3n, long ** 2n].map(
    (q) => finiteField(q),
  ),
  extensionField(primeField(5n), 'w', [3n, 1n]),
  f81,
  extensionField(f81, 'x', leastIrreducible(f81, 3, unlimited)),
  extensionField(finiteField(4n), 'y', leastIrreducible(finiteField(4n), 2, unlimited)),
];

const rows: readonly Row<unknown>[] = [
  {
    field: rationals,
    elements: fc
      .tuple(fc.bigInt({ min: -(1n << 70n), max: 1n << 70n }), fc.bigInt({ min: 1n, max: 1n << 40n }))
      .map(([a, b]) => rational(a, b)),
  },
  ...finiteFields.map(finite),
];

describe.each(rows.map((row) => [row.field.name, row] as const))(
  'the laws of a field over %s',
  (_, { field, elements }) => {
    const same = (a: unknown, b: unknown): void => expect(a).toEqual(b);
    const runs = { numRuns: 40 };

    it('is a commutative ring', () => {
      fc.assert(
        fc.property(elements, elements, elements, (a, b, c) => {
          same(field.add(a, b), field.add(b, a));
          same(field.multiply(a, b), field.multiply(b, a));
          same(field.add(field.add(a, b), c), field.add(a, field.add(b, c)));
          same(field.multiply(field.multiply(a, b), c), field.multiply(a, field.multiply(b, c)));
          same(field.multiply(a, field.add(b, c)), field.add(field.multiply(a, b), field.multiply(a, c)));
          same(field.add(a, field.zero), a);
          same(field.multiply(a, field.one), a);
          same(field.subtract(a, b), field.add(a, field.negate(b)));
          same(field.add(a, field.negate(a)), field.zero);
          expect(field.equal(a, b)).toBe(field.isZero(field.subtract(a, b)));
        }),
        runs,
      );
    });

    it('inverts every unit and nothing else', () => {
      fc.assert(
        fc.property(elements, (a) => {
          if (field.isZero(a)) expect(() => field.inverse(a)).toThrow(RangeError);
          else same(field.multiply(a, field.inverse(a)), field.one);
        }),
        runs,
      );
      expect(field.isZero(field.zero)).toBe(true);
      expect(field.isZero(field.one)).toBe(false);
    });

    it('receives the integers', () => {
      const integer = fc.bigInt({ min: -(1n << 80n), max: 1n << 80n });
      fc.assert(
        fc.property(integer, integer, (m, n) => {
          same(field.fromInteger(m + n), field.add(field.fromInteger(m), field.fromInteger(n)));
          same(field.fromInteger(m * n), field.multiply(field.fromInteger(m), field.fromInteger(n)));
        }),
        runs,
      );
      same(field.fromInteger(1n), field.one);
      same(field.fromInteger(field.characteristic), field.zero);
    });

    it('reads back what it writes', () => {
      fc.assert(
        fc.property(elements, (a) => {
          same(readElement(field.write(a), field), a);
          same(readElement(readText(elementText(field.write(a))), field), a);
        }),
        runs,
      );
    });
  },
);

describe.each(finiteFields.map((field) => [field.name, field] as const))('the finite field %s', (_, field) => {
  const q = field.order;
  const { elements } = finite(field);
  const small = q <= 300n ? Array.from({ length: Number(q) }, (_, i) => field.element(BigInt(i))) : undefined;

  it('orders its elements', () => {
    fc.assert(fc.property(fc.bigInt({ min: 0n, max: q - 1n }), (index) => field.index(field.element(index)) === index));
    expect([field.index(field.zero), field.index(field.one)]).toEqual([0n, 1n]);
    if (small) expect(new Set(small.map((a) => elementText(field.write(a)))).size).toBe(Number(q));
  });

  it('has q − 1 units and a Frobenius', () => {
    fc.assert(
      fc.property(elements, elements, fc.bigInt({ min: -(1n << 70n), max: 1n << 70n }), (a, b, n) => {
        expect(field.power(a, q)).toEqual(a);
        const p = field.characteristic;
        expect(field.power(field.add(a, b), p)).toEqual(field.add(field.power(a, p), field.power(b, p)));
        if (field.isZero(a)) return;
        expect(field.power(a, n)).toEqual(field.power(a, ((n % (q - 1n)) + q - 1n) % (q - 1n)));
      }),
      { numRuns: 15 },
    );
    expect(field.power(field.zero, 0n)).toEqual(field.one);
    expect(() => field.power(field.zero, -1n)).toThrow(RangeError);
  });

  it('tells squares by the criterion of Euler, and half of the units are squares', () => {
    fc.assert(
      fc.property(elements, (a) => {
        if (field.isZero(a)) return;
        const euler = q % 2n === 0n || field.equal(field.power(a, (q - 1n) / 2n), field.one);
        expect(field.isSquare(a)).toBe(euler);
        expect(field.isSquare(field.multiply(a, a))).toBe(true);
      }),
      { numRuns: 25 },
    );
    if (!small) return;
    const squares = new Set(small.slice(1).map((a) => field.index(field.multiply(a, a))));
    for (const a of small.slice(1)) expect(field.isSquare(a)).toBe(squares.has(field.index(a)));
  });

  it('names the least non-square', () => {
    if (q % 2n === 0n) {
      expect(field.nonSquare).toBeUndefined();
      return;
    }
    const least = field.index(field.nonSquare);
    expect(field.isSquare(field.nonSquare)).toBe(false);
    const first = least > 400n ? least - 400n : 1n;
    for (let index = first; index < least; index++) expect(field.isSquare(field.element(index))).toBe(true);
    for (let index = 1n; index < least && index < 400n; index++)
      expect(field.isSquare(field.element(index))).toBe(true);
  });
});
