import type { Coordinates, Order } from './order';

/** What a prime ideal is made of; the names are explained in `PrimeIdeal`. */
export interface PrimeIdealData {
  readonly order: Order;
  readonly p: bigint;
  readonly ramification: number;
  readonly residueDegree: number;
  readonly inverse: Coordinates;
  readonly idempotent: Coordinates;
  readonly generator: readonly bigint[] | undefined;
}

/**
 * A prime ideal 𝔭 of a number field above a prime p, by an order that is maximal at p; elements of the order stand by their coordinates. All
 * that is computed is modulo powers of p and at 𝔭 only: elements are multiplied by an idempotent that is 0 at the other primes above p.
 */
export class PrimeIdeal {
  readonly order: Order;
  readonly p: bigint;
  readonly ramification: number;
  readonly residueDegree: number;
  /** The order q of the residue field. */
  readonly residueOrder: bigint;
  /** inverse/p has order −1 at 𝔭 and order ≥ 0 at the other primes above p: p/inverse is the uniformizer of `unitPart`. */
  readonly inverse: Coordinates;
  /** A g over 𝔽_p, coefficients from the constant term up, with 𝔭 = (p, g) over ℤ[x]; `undefined` when p divides the index of ℤ[x]. */
  readonly generator: readonly bigint[] | undefined;
  private readonly idempotents: Coordinates[];

  constructor(data: PrimeIdealData) {
    this.order = data.order;
    this.p = data.p;
    this.ramification = data.ramification;
    this.residueDegree = data.residueDegree;
    this.residueOrder = data.p ** BigInt(data.residueDegree);
    this.inverse = data.inverse;
    this.generator = data.generator;
    this.idempotents = [data.idempotent];
  }

  /** The element modulo p^digits that is 1 at 𝔭 and 0 at the other primes above p. */
  one(digits: number): Coordinates {
    const { idempotents, order, p } = this;
    // e ↦ 3e² − 2e³ doubles the digits to which e is idempotent
    while (1 << (idempotents.length - 1) < digits) {
      const e = idempotents[idempotents.length - 1]!;
      const m = p ** BigInt(1 << idempotents.length);
      const square = order.multiply(e, e, m);
      const cube = order.multiply(square, e, m);
      idempotents.push(square.map((c, i) => (((3n * c - 2n * cube[i]!) % m) + m) % m));
    }
    const m = p ** BigInt(digits);
    return idempotents[32 - Math.clz32(digits - 1)]!.map((c) => c % m);
  }

  /**
   * The residue modulo 𝔭, as the only element of the order modulo p that reduces to it, is 0 at the other primes, and is its own q-th power:
   * these form a field.
   */
  residue(a: Coordinates): Coordinates {
    let power = this.residueOrder;
    while (power < BigInt(this.order.degree)) power *= this.residueOrder;
    return this.order.power(this.order.multiply(a, this.one(1), this.p), power, this.p);
  }

  /** The order of an element at 𝔭, and the unit a·(inverse/p)^order modulo p^digits; `undefined` when the order is `bound` or more. */
  unitPart(
    a: Coordinates,
    bound: number,
    digits: number,
  ): { readonly order: number; readonly unit: Coordinates } | undefined {
    const { order, p } = this;
    let m = p ** BigInt(bound + digits);
    let unit = order.multiply(a, this.one(bound + digits), m);
    for (let k = 0; k < bound; k++) {
      // in 𝔭 iff the product with `inverse` is divisible by p
      const next = order.multiply(unit, this.inverse, m);
      if (next.some((c) => c % p !== 0n)) {
        const kept = p ** BigInt(digits);
        return { order: k, unit: unit.map((c) => c % kept) };
      }
      unit = next.map((c) => c / p);
      m /= p;
    }
    return undefined;
  }
}
