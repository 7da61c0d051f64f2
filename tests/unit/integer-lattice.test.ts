import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { IntegerLattice, type SparseVector } from '@/engine/arith/integer-lattice';

const sparse = (entries: readonly number[]): SparseVector =>
  entries.flatMap((entry, i) => (entry === 0 ? [] : [[i, BigInt(entry)] as const]));

const vectors = (rows: number, columns: number): fc.Arbitrary<readonly (readonly number[])[]> =>
  fc.array(fc.array(fc.integer({ min: -4, max: 4 }), { minLength: columns, maxLength: columns }), {
    minLength: rows,
    maxLength: rows,
  });

const filled = (list: readonly (readonly number[])[]): IntegerLattice => {
  const lattice = new IntegerLattice();
  list.forEach((vector, i) => lattice.insert(sparse(vector), i));
  return lattice;
};

describe('lattices of integer vectors', () => {
  test('every combination of the generators is expressed, and the expression adds up', () => {
    fc.assert(
      fc.property(
        vectors(5, 4),
        fc.array(fc.integer({ min: -3, max: 3 }), { minLength: 5, maxLength: 5 }),
        (list, coefficients) => {
          const target = [0, 1, 2, 3].map((k) =>
            list.reduce((sum, vector, i) => sum + (coefficients[i] ?? 0) * (vector[k] ?? 0), 0),
          );
          const found = filled(list).express(sparse(target));
          expect(found).toBeDefined();
          const back = [0, 1, 2, 3].map((k) =>
            (found ?? []).reduce((sum, [i, c]) => sum + Number(c) * (list[i]?.[k] ?? 0), 0),
          );
          expect(back).toEqual(target);
        },
      ),
    );
  });

  test('a vector outside is not expressed: modulo 2 and 3 a lattice of multiples misses it', () => {
    fc.assert(
      fc.property(vectors(4, 3), fc.constantFrom(2, 3), (list, m) => {
        const lattice = filled(list.map((vector) => vector.map((entry) => m * entry)));
        expect(lattice.express([[1, BigInt(m + 1)]])).toBeUndefined();
        expect(lattice.express([])).toEqual([]);
      }),
    );
  });

  test('relations without a label leave no trace in an expression', () => {
    const lattice = new IntegerLattice();
    lattice.insert([[0, 4n]]);
    lattice.insert(
      [
        [0, 6n],
        [1, 1n],
      ],
      7,
    );
    expect(
      lattice.express([
        [0, 2n],
        [1, 1n],
      ]),
    ).toEqual([[7, 1n]]);
    expect(lattice.express([[0, 2n]])).toBeUndefined();
  });
});
