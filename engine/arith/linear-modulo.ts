import { inverseModulo, modulo } from './modular';

/** A basis in reduced echelon form: each vector has 1 at its pivot, where the others have 0. */
export interface Echelon {
  readonly vectors: readonly (readonly bigint[])[];
  readonly pivots: readonly number[];
}

/** The reduced echelon form of the space that vectors over 𝔽_p generate, p prime. */
export function echelonModulo(vectors: readonly (readonly bigint[])[], p: bigint, spend: () => void): Echelon {
  const rows = vectors.map((vector) => vector.map((c) => modulo(c, p)));
  const width = rows[0]?.length ?? 0;
  const pivots: number[] = [];
  for (let column = 0; column < width && pivots.length < rows.length; column++) {
    const at = rows.findIndex((row, i) => i >= pivots.length && row[column] !== 0n);
    if (at < 0) continue;
    spend();
    const rank = pivots.length;
    const pivot = rows[at]!;
    rows[at] = rows[rank]!;
    const inverse = inverseModulo(pivot[column]!, p);
    const scaled = pivot.map((c) => (c * inverse) % p);
    rows[rank] = scaled;
    for (let i = 0; i < rows.length; i++) {
      const head = rows[i]![column]!;
      if (i === rank || head === 0n) continue;
      const row = rows[i]!;
      for (let j = column; j < width; j++) row[j] = modulo(row[j]! - head * scaled[j]!, p);
    }
    pivots.push(column);
  }
  return { vectors: rows.slice(0, pivots.length), pivots };
}

/** The combinations c over 𝔽_p with Σ c_i · rows_i = 0, in reduced echelon form. */
export function relationsModulo(rows: readonly (readonly bigint[])[], p: bigint, spend: () => void): Echelon {
  const width = rows[0]?.length ?? 0;
  const marked = rows.map((row, i) => [...row, ...rows.map((_, k) => (i === k ? 1n : 0n))]);
  const { vectors, pivots } = echelonModulo(marked, p, spend);
  const relations = vectors.filter((_, i) => pivots[i]! >= width).map((vector) => vector.slice(width));
  return echelonModulo(relations, p, spend);
}
