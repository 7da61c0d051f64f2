/** What a coprime base needs to know of polynomials without repeated factors, normalised by their leading coefficients. */
export interface Pieces<P> {
  degree(f: P): number;
  gcd(f: P, g: P): P;
  /** f/g for a divisor g. */
  quotient(f: P, g: P): P;
  /** Those of the keys that f has. */
  keysOf(f: P, among: readonly number[]): readonly number[];
}

interface Piece<P> {
  readonly value: P;
  readonly keys: readonly number[];
}

/**
 * Square-free polynomials, pairwise coprime and of degree ≥ 1, of which all square-free polynomials put in are products. Two
 * polynomials with a common factor must have a common key; only those with a common key are compared, so that the work is
 * linear in the number of keys when few are shared by chance.
 */
export class CoprimePieces<P> {
  private readonly byKey = new Map<number, Set<Piece<P>>>();
  private readonly all = new Set<Piece<P>>();

  constructor(
    private readonly domain: Pieces<P>,
    private readonly spend: () => void,
  ) {}

  insert(f: P, keys: readonly number[]): void {
    const { domain } = this;
    let rest = f;
    for (const piece of this.sharing(keys)) {
      if (domain.degree(rest) < 1) return;
      this.spend();
      const common = domain.gcd(rest, piece.value);
      if (domain.degree(common) < 1) continue;
      rest = domain.quotient(rest, common);
      if (domain.degree(common) === domain.degree(piece.value)) continue;
      this.remove(piece);
      this.add(common, domain.keysOf(common, piece.keys));
      const other = domain.quotient(piece.value, common);
      this.add(other, domain.keysOf(other, piece.keys));
    }
    if (domain.degree(rest) > 0)
      this.add(rest, domain.degree(rest) < domain.degree(f) ? domain.keysOf(rest, keys) : keys);
  }

  /** The pieces that have one of these keys, as they are now. */
  sharing(keys: readonly number[]): readonly Piece<P>[] {
    const found = new Set<Piece<P>>();
    for (const key of keys) for (const piece of this.byKey.get(key) ?? []) found.add(piece);
    return [...found];
  }

  values(): readonly P[] {
    return [...this.all].map(({ value }) => value);
  }

  private add(value: P, keys: readonly number[]): void {
    const piece = { value, keys };
    this.all.add(piece);
    for (const key of keys) {
      const there = this.byKey.get(key);
      if (there === undefined) this.byKey.set(key, new Set([piece]));
      else there.add(piece);
    }
  }

  private remove(piece: Piece<P>): void {
    this.all.delete(piece);
    for (const key of piece.keys) this.byKey.get(key)?.delete(piece);
  }
}
