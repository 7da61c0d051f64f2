/**
 * Sets of rows that add up to zero modulo 2, by Gaussian elimination on packed rows. A row lists the columns it is odd in
 * (repetitions count). `spend` is called once a column.
 */
export function* dependencies(
  rows: readonly (readonly number[])[],
  columns: number,
  spend: () => void,
): Generator<readonly number[]> {
  const words = (columns + 31) >>> 5;
  const width = words + ((rows.length + 31) >>> 5);
  const matrix = rows.map((row, i) => {
    const packed = new Uint32Array(width);
    for (const column of row) packed[column >>> 5]! ^= 1 << (column & 31);
    packed[words + (i >>> 5)]! |= 1 << (i & 31);
    return packed;
  });
  let free = matrix;
  for (let column = 0; column < columns; column++) {
    spend();
    const word = column >>> 5;
    const bit = 1 << (column & 31);
    const pivotAt = free.findIndex((row) => row[word]! & bit);
    if (pivotAt === -1) continue;
    const pivot = free[pivotAt]!;
    free = free.filter((row) => row !== pivot);
    for (const row of free) {
      if (!(row[word]! & bit)) continue;
      for (let k = word; k < width; k++) row[k]! ^= pivot[k]!;
    }
  }
  for (const row of free) yield rows.map((_, i) => i).filter((i) => row[words + (i >>> 5)]! & (1 << (i & 31)));
}
