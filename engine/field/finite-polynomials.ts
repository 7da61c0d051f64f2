import type { FiniteField } from './field';
import { binaryPolynomials } from './binary-polynomials';
import { genericPolynomials } from './generic-polynomials';
import type { Polynomial } from './polynomial';
import { SmallPrimePolynomials, SMALL_PRIME_BOUND } from './small-prime-polynomials';

/**
 * Arithmetic of polynomials in one variable over a finite field 𝔽_q, in the shape P that is quickest for the field. The
 * algorithms that factor are written once, over this.
 */
export interface FinitePolynomials<P> {
  /** q, and the prime it is a power of. */
  readonly order: bigint;
  readonly characteristic: bigint;
  readonly one: P;
  readonly x: P;
  /** The degree; −1 for zero. */
  degree(f: P): number;
  add(f: P, g: P): P;
  subtract(f: P, g: P): P;
  multiply(f: P, g: P): P;
  /** f divided by its leading coefficient, for f ≠ 0. */
  monic(f: P): P;
  /** Quotient and remainder by g ≠ 0. */
  divide(f: P, g: P): { readonly quotient: P; readonly remainder: P };
  /** The monic greatest common divisor; zero when both are zero. */
  gcd(f: P, g: P): P;
  derivative(f: P): P;
  /** The p-th root of a polynomial in x^p, p the characteristic. */
  root(f: P): P;
  /** A polynomial of degree < n, coefficients drawn from a fixed stream. */
  draw(n: number, stream: () => number): P;
  /** Multiplication modulo a monic m of degree ≥ 1, of two factors of degree < deg m. */
  multiplyModulo(m: P): (f: P, g: P) => P;
  /** Σ f_i · rows_i over the coefficients f_i of f. */
  combine(f: P, rows: readonly P[]): P;
  /** How many rows of a linear map may be kept at once. */
  readonly rowLimit: number;
}

/** An arithmetic with the way into it and back. */
export interface Shape<E, P> {
  readonly ring: FinitePolynomials<P>;
  read(f: Polynomial<E>): P;
  write(f: P): Polynomial<E>;
}

/**
 * Hands the quickest arithmetic for the field to `work`: bits over 𝔽_2, numbers over the prime fields with p < 2^31, the
 * operations of the field otherwise. `spend` is called along long operations.
 */
export function withFinitePolynomials<E, R>(
  field: FiniteField<E>,
  spend: () => void,
  work: <P>(shape: Shape<E, P>) => R,
): R {
  if (field.order !== field.characteristic || field.order >= SMALL_PRIME_BOUND) {
    return work({ ring: genericPolynomials(field, spend), read: (f) => f, write: (f) => f });
  }
  if (field.order === 2n) {
    return work({
      ring: binaryPolynomials(spend),
      read(f) {
        const bits = new Uint32Array((f.length + 31) >>> 5);
        f.forEach((c, i) => {
          if (!field.isZero(c)) bits[i >>> 5]! |= 1 << (i & 31);
        });
        return bits;
      },
      write(bits) {
        const n = 32 * bits.length - (bits.length === 0 ? 0 : Math.clz32(bits[bits.length - 1]!));
        return Array.from({ length: n }, (_, i) => ((bits[i >>> 5]! >>> (i & 31)) & 1 ? field.one : field.zero));
      },
    });
  }
  return work({
    ring: new SmallPrimePolynomials(Number(field.order), spend),
    read: (f) => f.map((c) => Number(field.index(c))),
    write: (f) => f.map((c) => field.element(BigInt(c))),
  });
}
