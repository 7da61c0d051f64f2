import { echelonModulo } from '../arith/linear-modulo';
import type { Coordinates } from '../field/order';
import type { PrimeIdeal } from '../field/prime-ideal';

/**
 * The square classes of the completion at a prime ideal 𝔭 above 2, of ramification index e and residue field 𝔽_q, q = 2^f. The ef + 2 bits of a class,
 * from the lowest: the parity of the order; for each odd i < 2e, f bits for the classes of 1 + θπⁱ, θ in a basis of 𝔽_q over 𝔽_2; one
 * for the unramified class 1 + θπ^(2e). A unit is multiplied by squares and by these until it is 1 modulo 𝔭^(2e+1), and then it is a square:
 * O. T. O'Meara, Introduction to Quadratic Forms, 63:1–63:4 and 63:9 (numbers from memory).
 */
export class DyadicUnits {
  readonly dimension: number;
  /** Binary digits of a unit that settle its class. */
  readonly digits: number;
  private readonly e: number;
  /** A basis of the residue field over 𝔽_2 and the places at which one of its members has 1 and the others 0. */
  private readonly basis: readonly Coordinates[];
  private readonly pivots: readonly number[];
  private readonly uniformizer: Coordinates;
  /** The inverse of the residue of uniformizer·inverse/2, and of that of 2/uniformizer^e. */
  private readonly slope: Coordinates;
  private readonly scale: Coordinates;

  constructor(private readonly prime: PrimeIdeal) {
    const { order, ramification, residueDegree } = prime;
    this.e = ramification;
    this.dimension = ramification * residueDegree + 2;
    this.digits = 2 * ramification + 2;
    const vectors = Array.from({ length: order.degree }, (_, i) =>
      Array.from({ length: order.degree }, (_unused, j) => (i === j ? 1n : 0n)),
    );
    const { vectors: basis, pivots } = echelonModulo(
      vectors.map((x) => prime.residue(x)),
      2n,
      order.spend,
    );
    this.basis = basis;
    this.pivots = pivots;
    const two = order.coordinates([2n]);
    this.uniformizer = ramification === 1 ? two : this.ofOrderOne(vectors);
    this.slope = this.inverted(this.residueAt(this.uniformizer, 1));
    this.scale = this.inverted(this.product(this.residueAt(two, this.e), this.powered(this.slope, this.e)));
  }

  /** The class of an element, known to `bound` + `digits` digits; `undefined` when its order is `bound` or more. */
  classOf(a: Coordinates, bound: number): bigint | undefined {
    const found = this.prime.unitPart(a, bound, this.digits);
    if (found === undefined) return undefined;
    return (this.classOfUnit(found.unit) << 1n) | (found.order % 2 === 1 ? 1n : 0n);
  }

  /** An element of each class that is a single bit, to this many digits. */
  representatives(digits: number): readonly Coordinates[] {
    const { order, inverse } = this.prime;
    // 2·inverse is the uniformizer 2/inverse times a square
    const result: Coordinates[] = [inverse.map((c) => 2n * c)];
    for (let i = 1; i < 2 * this.e; i += 2) for (const theta of this.basis) result.push(this.near(theta, i, digits));
    const theta = this.basis.find((c) => this.trace(c) === 1n)!;
    result.push(this.near(theta, 2 * this.e, digits));
    return result.map((c) => order.multiply(c, this.prime.one(digits), 2n ** BigInt(digits)));
  }

  private classOfUnit(unit: Coordinates): bigint {
    const { prime, e, digits } = this;
    const { order } = prime;
    const m = 2n ** BigInt(digits);
    const one = prime.one(digits);
    const q = prime.residueOrder;
    // s^(q/2 − 1) is the root of 1/s
    let u = unit;
    if (q > 2n) {
      const root = order.power(prime.residue(unit), q / 2n - 1n, 2n);
      u = order.multiply(u, order.multiply(root, root, m), m);
    }
    let mask = 0n;
    let bit = 0n;
    for (let i = 1; i <= 2 * e; i++) {
      const c = this.product(this.residueAt(difference(u, one, m), i), this.powered(this.slope, i));
      if (i === 2 * e) mask |= this.trace(c) << bit;
      else if (i % 2 === 0) {
        const root = this.near(order.power(c, q / 2n, 2n), i / 2, digits);
        u = order.multiply(u, order.multiply(root, root, m), m);
      } else {
        this.basis.forEach((theta, k) => {
          if (c[this.pivots[k]!] === 1n) {
            mask |= 1n << bit;
            u = order.multiply(u, this.near(theta, i, digits), m);
          }
          bit++;
        });
      }
    }
    return mask;
  }

  /** 1 + θ·uniformizerⁱ at 𝔭. */
  private near(theta: Coordinates, i: number, digits: number): Coordinates {
    const { order } = this.prime;
    const m = 2n ** BigInt(digits);
    const one = this.prime.one(digits);
    const term = order.multiply(order.multiply(theta, order.power(this.uniformizer, BigInt(i), m), m), one, m);
    return one.map((c, k) => (c + term[k]!) % m);
  }

  /** The residue of a·(inverse/2)^k, for an element of order k or more. */
  private residueAt(a: Coordinates, k: number): Coordinates {
    const { order, inverse } = this.prime;
    let x = order.multiply(a, this.prime.one(k + 1), 2n ** BigInt(k + 1));
    for (let left = k; left > 0; left--) x = order.multiply(x, inverse, 2n ** BigInt(left + 1)).map((c) => c / 2n);
    return this.prime.residue(x);
  }

  private ofOrderOne(candidates: readonly Coordinates[]): Coordinates {
    for (const x of candidates) {
      const residue = this.prime.residue(x);
      const rest = x.map((c, i) => c - residue[i]!);
      if (this.prime.unitPart(rest, 2, 1)?.order === 1) return rest;
    }
    throw new Error('no uniformizer among the nilpotent parts of a basis');
  }

  private product(a: Coordinates, b: Coordinates): Coordinates {
    return this.prime.order.multiply(a, b, 2n);
  }

  private powered(a: Coordinates, k: number): Coordinates {
    return this.prime.order.power(a, BigInt(k), 2n);
  }

  private inverted(a: Coordinates): Coordinates {
    const q = this.prime.residueOrder;
    return q === 2n ? a : this.prime.order.power(a, q - 2n, 2n);
  }

  /** The trace to 𝔽_2 of c·scale²: 0 iff 1 + c·uniformizer^(2e) is a square. */
  private trace(c: Coordinates): bigint {
    let power = this.product(c, this.product(this.scale, this.scale));
    let sum = power;
    for (let k = 1; k < this.prime.residueDegree; k++) {
      power = this.product(power, power);
      sum = sum.map((a, i) => (a + power[i]!) % 2n);
    }
    return sum.some((a) => a !== 0n) ? 1n : 0n;
  }
}

const difference = (a: Coordinates, b: Coordinates, m: bigint): Coordinates =>
  a.map((c, i) => (((c - b[i]!) % m) + m) % m);
