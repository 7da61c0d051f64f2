import type { Expression } from '@/engine/expression/expression';
import type { Element } from '@/engine/expression/element';

/** What is needed of a field. */
export interface Coefficients<E> {
  readonly zero: E;
  readonly one: E;
  readonly characteristic: bigint;
  add(a: E, b: E): E;
  subtract(a: E, b: E): E;
  multiply(a: E, b: E): E;
  negate(a: E): E;
  inverse(a: E): E;
  isZero(a: E): boolean;
}

/** A formal sum of units, each with its coefficient. */
export type FormalForm<E> = readonly (readonly [coefficient: bigint, unit: E])[];

/**
 * The form of a word in which only η, symbols, forms and integers occur, by [a] ↦ ⟨a⟩ − 1 and η ↦ 1: over a field this is the map of
 * K^MW_n to the Witt ring, and in degree 0 to the Grothendieck–Witt ring.
 */
export function formOf<E>(e: Expression, field: Coefficients<E>, read: (entry: Element) => E): FormalForm<E> {
  const one: FormalForm<E> = [[1n, field.one]];
  const scaled = (c: bigint, x: FormalForm<E>): FormalForm<E> => x.map(([k, u]) => [c * k, u]);
  const times = (x: FormalForm<E>, y: FormalForm<E>): FormalForm<E> =>
    x.flatMap(([k, u]) => y.map(([l, v]) => [k * l, field.multiply(u, v)] as const));
  const minusOne = field.negate(field.one);
  switch (e.kind) {
    case 'integer':
      return scaled(e.value, one);
    case 'eta':
      return one;
    case 'symbol':
      return e.entries
        .map((a): FormalForm<E> => [
          [1n, read(a)],
          [-1n, field.one],
        ])
        .reduce(times, one);
    case 'angle':
      return e.entries.map((a) => [1n, read(a)] as const);
    case 'pfister':
      return e.entries
        .map((a): FormalForm<E> => [
          [1n, field.one],
          [-1n, read(a)],
        ])
        .reduce(times, one);
    case 'hyperbolic':
      return [
        [1n, field.one],
        [1n, minusOne],
      ];
    case 'epsilon':
      return [[-1n, minusOne]];
    case 'negate':
      return scaled(-1n, formOf(e.of, field, read));
    case 'sum':
      return e.terms.flatMap((term) => formOf(term, field, read));
    case 'product':
      return e.factors.map((factor) => formOf(factor, field, read)).reduce(times, one);
    case 'power':
      return Array.from({ length: e.exponent }, () => formOf(e.base, field, read)).reduce(times, one);
    case 'epsilonInteger':
      throw new RangeError('no n_ε in canonical forms');
  }
}

/**
 * A symmetric bilinear form by its Gram matrix as diagonal entries and a number of metabolic planes, which are ⟨1⟩ + ⟨−1⟩ in the
 * Grothendieck–Witt ring; planes are left over in characteristic 2 only. J. Milnor, D. Husemoller, Symmetric Bilinear Forms, I.3.
 */
export function diagonalised<E>(
  field: Coefficients<E>,
  gram: readonly (readonly E[])[],
): { readonly entries: readonly E[]; readonly planes: number } {
  let rows = gram.map((row) => [...row]);
  const entries: E[] = [];
  while (rows.length > 0) {
    let pivot = rows.findIndex((row, i) => !field.isZero(row[i]!));
    if (pivot < 0) {
      if (field.characteristic === 2n) return { entries, planes: rows.length / 2 };
      // e_i + e_j with B(e_i, e_j) ≠ 0
      const j = rows[0]!.findIndex((c) => !field.isZero(c));
      rows = rows.map((row, i) => (i === 0 ? row.map((c, k) => field.add(c, rows[j]![k]!)) : row));
      for (const row of rows) row[0] = field.add(row[0]!, row[j]!);
      pivot = 0;
    }
    const d = rows[pivot]![pivot]!;
    entries.push(d);
    const others = rows.map((_, i) => i).filter((i) => i !== pivot);
    const inverse = field.inverse(d);
    rows = others.map((i) =>
      others.map((j) =>
        field.subtract(rows[i]![j]!, field.multiply(field.multiply(rows[i]![pivot]!, inverse), rows[pivot]![j]!)),
      ),
    );
  }
  return { entries, planes: 0 };
}

/** An extension k[y]/(P) whose elements are polynomials in y. */
export interface Extension<E> extends Coefficients<readonly E[]> {
  readonly base: Coefficients<E>;
  readonly modulus: readonly E[];
  letter(name: string): readonly E[] | undefined;
}

/** The Scharlau transfer of ⟨u⟩ along s(y^(d−1)) = 1, s(yⁱ) = 0 for i < d − 1. W. Scharlau, Quadratic and Hermitian Forms, 2.5. */
export function transferOf<E>(
  extension: Extension<E>,
  u: readonly E[],
): { readonly entries: readonly E[]; readonly planes: number } {
  const { base, modulus } = extension;
  const d = modulus.length - 1;
  const y = extension.letter('y')!;
  const powers: (readonly E[])[] = [u];
  for (let i = 1; i <= 2 * d - 2; i++) powers.push(extension.multiply(powers[i - 1]!, y));
  const gram = Array.from({ length: d }, (_, i) =>
    Array.from({ length: d }, (_unused, j) => powers[i + j]![d - 1] ?? base.zero),
  );
  return diagonalised(base, gram);
}
