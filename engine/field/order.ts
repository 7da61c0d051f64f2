import { modulo } from '../arith/modular';
import type { IntegerPolynomial } from './integer-polynomial';
import { multiplyModuloMonic } from './integer-residues';

/** Coordinates over the basis of an order. */
export type Coordinates = readonly bigint[];

/**
 * An order of ℚ[x]/(modulus), modulus monic of degree n over ℤ, that contains ℤ[x]. Its basis is rows[i]/denominator for i = 0 … n − 1; row i has
 * length n and degree i, and its leading coefficient divides the denominator.
 */
export class Order {
  readonly degree: number;

  constructor(
    readonly modulus: IntegerPolynomial,
    readonly rows: readonly (readonly bigint[])[],
    readonly denominator: bigint,
    readonly spend: () => void,
  ) {
    this.degree = modulus.length - 1;
  }

  /** The coordinates of an element of ℤ[x]. */
  coordinates(f: IntegerPolynomial): Coordinates {
    return this.solved(Array.from({ length: this.degree }, (_, i) => (f[i] ?? 0n) * this.denominator));
  }

  /** The polynomial that is `denominator` times an element. */
  polynomial(a: Coordinates): IntegerPolynomial {
    const sum = new Array<bigint>(this.degree).fill(0n);
    a.forEach((c, i) => {
      if (c === 0n) return;
      const row = this.rows[i]!;
      for (let j = 0; j <= i; j++) sum[j]! += c * row[j]!;
    });
    while (sum.length > 0 && sum[sum.length - 1] === 0n) sum.pop();
    return sum;
  }

  /** The product, coordinates 0 … m − 1 when a modulus m is given. */
  multiply(a: Coordinates, b: Coordinates, m?: bigint): Coordinates {
    this.spend();
    const product = multiplyModuloMonic(this.polynomial(a), this.polynomial(b), this.modulus);
    const divided = Array.from({ length: this.degree }, (_, i) => (product[i] ?? 0n) / this.denominator);
    const result = this.solved(divided);
    return m === undefined ? result : result.map((c) => modulo(c, m));
  }

  /** a^k modulo m for k ≥ 1. */
  power(a: Coordinates, k: bigint, m: bigint): Coordinates {
    let result = a;
    for (const bit of k.toString(2).slice(1)) {
      result = this.multiply(result, result, m);
      if (bit === '1') result = this.multiply(result, a, m);
    }
    return result;
  }

  /** Σ c_i · rows_i = the polynomial given. */
  private solved(polynomial: bigint[]): bigint[] {
    const result = new Array<bigint>(this.degree).fill(0n);
    for (let i = this.degree - 1; i >= 0; i--) {
      const row = this.rows[i]!;
      const c = polynomial[i]! / row[i]!;
      result[i] = c;
      if (c !== 0n) for (let j = 0; j <= i; j++) polynomial[j]! -= c * row[j]!;
      if (polynomial[i] !== 0n) throw new RangeError('not an element of the order');
    }
    return result;
  }
}

/** ℤ[x] itself. */
export function powerOrder(modulus: IntegerPolynomial, spend: () => void): Order {
  const n = modulus.length - 1;
  const rows = Array.from({ length: n }, (_, i) => Array.from({ length: n }, (_unused, j) => (i === j ? 1n : 0n)));
  return new Order(modulus, rows, 1n, spend);
}
