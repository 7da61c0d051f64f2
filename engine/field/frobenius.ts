import type { FinitePolynomials } from './finite-polynomials';

/** f^n for n ≥ 1 under an associative multiplication. */
export function powerOf<P>(multiply: (f: P, g: P) => P, f: P, n: bigint): P {
  let result = f;
  for (const bit of n.toString(2).slice(1)) {
    result = multiply(result, result);
    if (bit === '1') result = multiply(result, f);
  }
  return result;
}

/**
 * h ↦ h^q modulo a polynomial m of degree ≥ 1 over 𝔽_q. The map is linear over 𝔽_q, so that once x^q is known each
 * value costs a product of a vector and a matrix; the matrix is made at its first use, and never when it would be too large.
 */
export class Frobenius<P> {
  private readonly multiply: (f: P, g: P) => P;
  private power: P | undefined;

  constructor(
    private readonly ring: FinitePolynomials<P>,
    private readonly m: P,
    private rows?: readonly P[],
  ) {
    this.multiply = ring.multiplyModulo(m);
  }

  /** x^q modulo m. */
  ofX(): P {
    if (this.rows !== undefined && this.rows.length > 1) return this.rows[1]!;
    const x = this.ring.divide(this.ring.x, this.m).remainder;
    return (this.power ??= powerOf(this.multiply, x, this.ring.order));
  }

  /** h^q modulo m, for h of degree < deg m. */
  apply(h: P): P {
    const n = this.ring.degree(this.m);
    if (n > this.ring.rowLimit) return powerOf(this.multiply, h, this.ring.order);
    if (this.rows === undefined) {
      const power = this.ofX();
      const rows = [this.ring.one, power];
      while (rows.length < n) rows.push(this.multiply(rows[rows.length - 1]!, power));
      this.rows = rows;
    }
    return this.ring.combine(h, this.rows);
  }

  /** The same map modulo a divisor of m. */
  modulo(divisor: P): Frobenius<P> {
    const reduced = (f: P): P => this.ring.divide(f, divisor).remainder;
    const rows = this.rows?.slice(0, this.ring.degree(divisor)).map(reduced);
    const map = new Frobenius(this.ring, divisor, rows);
    if (this.power !== undefined) map.power = reduced(this.power);
    return map;
  }
}
