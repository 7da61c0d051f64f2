import { echelonModulo } from '../arith/linear-modulo';
import { seeded } from '../arith/seeded';
import type { Coordinates } from '../field/order';
import type { PrimeIdeal } from '../field/prime-ideal';
import { DyadicUnits } from './dyadic-units';
import { parity, type NumberPlace } from './number-place';

/**
 * The place at a prime ideal above 2. The symbol is found from values of norm forms: those of x² − ay² are the b with (a, b) = 1, and their classes are a
 * subgroup of index 2 when a is no square (O'Meara, Introduction to Quadratic Forms, 63:13a, number from memory). Values are drawn
 * from a fixed stream until they generate so many classes.
 */
export function dyadicNumberPlace(prime: PrimeIdeal): NumberPlace {
  const units = new DyadicUnits(prime);
  // values of norm forms that have a higher order than this are passed over
  const bound = 4 * prime.ramification + 8;
  const digits = bound + units.digits;
  let representatives: readonly Coordinates[] | undefined;
  const conditions = new Map<bigint, bigint>();
  const conditionOf = (x: bigint): bigint => {
    const known = conditions.get(x);
    if (known !== undefined) return known;
    representatives ??= units.representatives(digits);
    const { order } = prime;
    const m = 2n ** BigInt(digits);
    const chosen = representatives.filter((_, i) => ((x >> BigInt(i)) & 1n) === 1n);
    const found = normCondition(
      prime,
      units,
      chosen.reduce((product, a) => order.multiply(product, a, m)),
      bound,
    );
    conditions.set(x, found);
    return found;
  };
  return {
    classOf(a, most) {
      const found = units.classOf(prime.order.coordinates(a), most);
      if (found === undefined) throw new RangeError('an order past its bound');
      return found;
    },
    hilbert(x, y) {
      if (x === 0n || y === 0n) return 0;
      return conditions.has(y) ? parity(conditionOf(y), x) : parity(conditionOf(x), y);
    },
  };
}

/** The mask with which the class of b has an even number of common bits iff b is a value of x² − ay² up to squares, for a that is no square. */
function normCondition(prime: PrimeIdeal, units: DyadicUnits, a: Coordinates, bound: number): bigint {
  const { order } = prime;
  const digits = bound + units.digits;
  const m = 2n ** BigInt(digits);
  const stream = seeded(order.degree);
  const square = (): Coordinates => {
    const x = Array.from({ length: order.degree }, () => BigInt(stream() * 4294967296) % m);
    const local = order.multiply(x, prime.one(digits), m);
    return order.multiply(local, local, m);
  };
  let found: readonly (readonly bigint[])[] = [];
  while (found.length < units.dimension - 1) {
    const other = order.multiply(square(), a, m);
    const norm = square().map((c, i) => (((c - other[i]!) % m) + m) % m);
    const value = units.classOf(norm, bound);
    if (value === undefined) continue;
    const bits = Array.from({ length: units.dimension }, (_, i) => (value >> BigInt(i)) & 1n);
    found = echelonModulo([...found, bits], 2n, order.spend).vectors;
  }
  // each vector has one bit at its pivot; all bits but one are pivots, and that one decides the others
  const pivots = found.map((vector) => vector.indexOf(1n));
  const free = Array.from({ length: units.dimension }, (_, i) => i).find((i) => !pivots.includes(i))!;
  return found.reduce((mask, vector, k) => mask | (vector[free]! << BigInt(pivots[k]!)), 1n << BigInt(free));
}
