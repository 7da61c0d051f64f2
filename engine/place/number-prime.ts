import type { Budget } from '../arith/budget';
import { factor } from '../arith/factor';
import type { Int } from '../arith/int';
import { valuation } from '../arith/valuation';
import { normOf } from '../field/integer-residues';
import type { NumberField, NumberFieldElement } from '../field/number-field';
import type { Coordinates } from '../field/order';
import type { PrimeIdeal } from '../field/prime-ideal';
import { primesAbove } from '../field/primes-above';
import type { UnitGroup } from '../ring/residue-class-ring';
import type { LocalEntry } from './theta-ring';

/** A finite place of a number field, with its residue field. */
export class NumberPrime {
  readonly units: UnitGroup<Coordinates>;
  /** The reduction of p·(inverse/p)^e, e the ramification index: the unit part of p. */
  private readonly unitOfPrime: Coordinates;

  constructor(
    readonly ideal: PrimeIdeal,
    private readonly field: NumberField,
    private readonly spend: () => void,
  ) {
    const { order, p, residueOrder: q } = ideal;
    const one = ideal.residue(order.coordinates([1n]));
    const minusOne = ideal.residue(order.coordinates([-1n]));
    const equal = (a: Coordinates, b: Coordinates): boolean => a.every((c, i) => c === b[i]);
    const power = (a: Coordinates, n: Int): Coordinates => {
      const exponent = ((BigInt(n) % (q - 1n)) + q - 1n) % (q - 1n);
      return exponent === 0n ? one : order.power(a, exponent, p);
    };
    this.units = {
      one,
      minusOne,
      multiply: (a, b) => order.multiply(a, b, p),
      power,
      equal,
      classOfMinusOne: p === 2n || q % 4n === 1n ? 0 : 1,
      orderModFour: p === 2n ? 2 : q % 4n === 1n ? 1 : 3,
    };
    const bound = ideal.ramification + 1;
    this.unitOfPrime = ideal.residue(ideal.unitPart(order.coordinates([p]), bound, 1)!.unit);
  }

  /** A unit of the number field as this place sees it, against the uniformizer p/inverse. */
  local(a: NumberFieldElement): LocalEntry<Coordinates> {
    const { order, p, ramification } = this.ideal;
    const { numerator, denominator } = this.field.model.integral(a);
    const bound = valuation(normOf(numerator, this.field.model.modulus, this.spend), p).exponent + 1;
    const above = this.ideal.unitPart(order.coordinates(numerator), bound, 1);
    if (above === undefined) throw new RangeError('0 has no order');
    const below = valuation(denominator, p);
    const { multiply, power } = this.units;
    const scale = multiply(
      power(this.unitOfPrime, -below.exponent),
      power(this.ideal.residue(order.coordinates([below.unit])), -1),
    );
    const unit = multiply(this.ideal.residue(above.unit), scale);
    return { valuation: above.order - ramification * below.exponent, unit, squareClass: this.squareClass(unit) };
  }

  /** 0 for a square of the residue field, 1 for another unit. */
  squareClass(unit: Coordinates): 0 | 1 {
    const { p, residueOrder: q } = this.ideal;
    if (p === 2n) return 0;
    return this.units.equal(this.ideal.order.power(unit, (q - 1n) / 2n, p), this.units.one) ? 0 : 1;
  }
}

/** The finite places at which one of the elements, none 0, is no unit, and those above 2; in a fixed order. */
export function numberPrimes(
  field: NumberField,
  elements: readonly NumberFieldElement[],
  budget: Budget,
): readonly NumberPrime[] {
  const spend = (): void => budget.spend(`looking at the primes of ${field.name}`);
  const primes = new Set<bigint>([2n]);
  for (const a of elements) {
    const { numerator, denominator } = field.model.integral(a);
    const norm = normOf(numerator, field.model.modulus, spend);
    for (const n of [norm < 0n ? -norm : norm, denominator])
      if (n !== 1n) for (const { prime } of factor(n, budget)) primes.add(prime);
  }
  return [...primes]
    .sort((a, b) => (a < b ? -1 : 1))
    .flatMap((p) => primesAbove(field.model.modulus, p, budget).map((ideal) => new NumberPrime(ideal, field, spend)));
}
