/** An integer vector: places with entries that are not 0, places ascending. */
export type SparseVector = readonly (readonly [place: number, entry: bigint])[];

/** A vector with the combination of generators it is: their labels with coefficients. */
interface Known {
  readonly vector: SparseVector;
  readonly combination: SparseVector;
}

/**
 * The lattice that some integer vectors generate, kept in echelon form, one vector for each leading place. Generators carry
 * labels, numbers; relations of the ambient group can be given without one. Hermite reduction by extended gcds of leading
 * entries: H. Cohen, A Course in Computational Algebraic Number Theory, Algorithm 2.4.4 (number from memory), on sparse vectors.
 */
export class IntegerLattice {
  private readonly pivots = new Map<number, Known>();

  /** `spend` is called for every combination of two vectors. */
  constructor(private readonly spend: () => void = () => undefined) {}

  /** Adds a generator. */
  insert(vector: SparseVector, label?: number): void {
    let rest: Known = { vector, combination: label === undefined ? [] : [[label, 1n]] };
    for (let head = rest.vector[0]; head !== undefined; head = rest.vector[0]) {
      this.spend();
      const [place, a] = head;
      const pivot = this.pivots.get(place);
      if (pivot === undefined) {
        this.pivots.set(place, rest);
        return;
      }
      const b = pivot.vector[0]?.[1] ?? 1n;
      if (a % b === 0n) {
        rest = combined(1n, rest, -(a / b), pivot);
        continue;
      }
      const { divisor, s, t } = extendedGcd(b, a);
      this.pivots.set(place, combined(s, pivot, t, rest));
      rest = combined(b / divisor, rest, -(a / divisor), pivot);
    }
  }

  /** The target as a combination of generators, `undefined` where it is not in the lattice. */
  express(target: SparseVector): SparseVector | undefined {
    let rest: Known = { vector: target, combination: [] };
    for (let head = rest.vector[0]; head !== undefined; head = rest.vector[0]) {
      const [place, a] = head;
      const pivot = this.pivots.get(place);
      const b = pivot?.vector[0]?.[1];
      if (pivot === undefined || b === undefined || a % b !== 0n) return undefined;
      rest = combined(1n, rest, -(a / b), pivot);
    }
    return rest.combination.map(([label, c]) => [label, -c] as const);
  }
}

const combined = (s: bigint, x: Known, t: bigint, y: Known): Known => ({
  vector: combinedVectors(s, x.vector, t, y.vector),
  combination: combinedVectors(s, x.combination, t, y.combination),
});

/** s·x + t·y. */
function combinedVectors(s: bigint, x: SparseVector, t: bigint, y: SparseVector): SparseVector {
  const sum: (readonly [number, bigint])[] = [];
  let [i, j] = [0, 0];
  for (;;) {
    const [a, b] = [x[i], y[j]];
    if (a === undefined && b === undefined) return sum;
    const place = a === undefined ? (b?.[0] ?? 0) : b === undefined ? a[0] : Math.min(a[0], b[0]);
    let entry = 0n;
    if (a?.[0] === place) {
      entry += s * a[1];
      i += 1;
    }
    if (b?.[0] === place) {
      entry += t * b[1];
      j += 1;
    }
    if (entry !== 0n) sum.push([place, entry]);
  }
}

/** divisor = gcd(a, b) = s·a + t·b, up to sign, for a ≠ 0. */
function extendedGcd(a: bigint, b: bigint): { readonly divisor: bigint; readonly s: bigint; readonly t: bigint } {
  let [r0, r1] = [a, b];
  let [s0, s1] = [1n, 0n];
  let [t0, t1] = [0n, 1n];
  while (r1 !== 0n) {
    const q = r0 / r1;
    [r0, r1] = [r1, r0 - q * r1];
    [s0, s1] = [s1, s0 - q * s1];
    [t0, t1] = [t1, t0 - q * t1];
  }
  return { divisor: r0, s: s0, t: t0 };
}
