import type { Budget } from '../arith/budget';
import { factor } from '../arith/factor';
import { valuation } from '../arith/valuation';
import { normOf } from '../field/integer-residues';
import type { NumberField, NumberFieldElement } from '../field/number-field';
import type { Coordinates } from '../field/order';
import type { PrimeIdeal } from '../field/prime-ideal';
import { primesAbove } from '../field/primes-above';

/** coefficient · {a, b} in K_2 of a number field. */
export interface WeightedSymbol {
  readonly coefficient: bigint;
  readonly a: NumberFieldElement;
  readonly b: NumberFieldElement;
}

/**
 * Whether the tame symbol of Σ coefficient · {a, b} is 1 at every prime of a number field: with a = πᵐu, b = πⁿv it is
 * (−1)^(mn) uⁿ/vᵐ in the units of the residue field (J. Milnor, Introduction to Algebraic K-Theory, Lemma 11.5, number from memory).
 */
export function tameSymbolsVanish(field: NumberField, symbols: readonly WeightedSymbol[], budget: Budget): boolean {
  const spend = (): void => budget.spend(`computing tame symbols of ${field.name}`);
  const primes = new Set<bigint>();
  for (const a of new Set(symbols.flatMap((symbol) => [symbol.a, symbol.b]))) {
    const { numerator, denominator } = field.model.integral(a);
    const norm = normOf(numerator, field.model.modulus, spend);
    for (const n of [norm < 0n ? -norm : norm, denominator])
      if (n !== 1n) for (const { prime } of factor(n, budget)) primes.add(prime);
  }
  return [...primes].every((p) =>
    primesAbove(field.model.modulus, p, budget).every((ideal) => {
      const place = new NumberPrime(ideal, field, spend);
      return place.isOne(symbols.reduce((product, symbol) => place.times(product, place.tame(symbol)), place.one));
    }),
  );
}

/** A finite place of a number field, with the units of its residue field. */
class NumberPrime {
  readonly one: Coordinates;
  private readonly minusOne: Coordinates;
  /** The reduction of p·(inverse/p)^e, e the ramification index: the unit part of p. */
  private readonly unitOfPrime: Coordinates;

  constructor(
    private readonly ideal: PrimeIdeal,
    private readonly field: NumberField,
    private readonly spend: () => void,
  ) {
    const { order, p } = ideal;
    this.one = ideal.residue(order.coordinates([1n]));
    this.minusOne = ideal.residue(order.coordinates([-1n]));
    const own = ideal.unitPart(order.coordinates([p]), ideal.ramification + 1, 1);
    if (own === undefined) throw new RangeError('p has its ramification index as order');
    this.unitOfPrime = ideal.residue(own.unit);
  }

  times(a: Coordinates, b: Coordinates): Coordinates {
    return this.ideal.order.multiply(a, b, this.ideal.p);
  }

  isOne(a: Coordinates): boolean {
    return a.every((c, i) => c === this.one[i]);
  }

  /** The tame symbol of one symbol, to its coefficient. */
  tame({ coefficient, a, b }: WeightedSymbol): Coordinates {
    const [x, y] = [this.local(a), this.local(b)];
    const sign = x.order % 2n !== 0n && y.order % 2n !== 0n ? this.minusOne : this.one;
    const value = this.times(sign, this.times(this.power(x.unit, y.order), this.power(y.unit, -x.order)));
    return this.power(value, coefficient);
  }

  /** The order of an element, and the residue of its unit part against the uniformizer p/inverse. */
  private local(a: NumberFieldElement): { readonly order: bigint; readonly unit: Coordinates } {
    const { order, p, ramification } = this.ideal;
    const { numerator, denominator } = this.field.model.integral(a);
    const bound = valuation(normOf(numerator, this.field.model.modulus, this.spend), p).exponent + 1;
    const above = this.ideal.unitPart(order.coordinates(numerator), bound, 1);
    if (above === undefined) throw new RangeError('0 has no order');
    const below = valuation(denominator, p);
    const scale = this.times(
      this.power(this.unitOfPrime, -BigInt(below.exponent)),
      this.power(this.ideal.residue(order.coordinates([below.unit])), -1n),
    );
    return {
      order: BigInt(above.order - ramification * below.exponent),
      unit: this.times(this.ideal.residue(above.unit), scale),
    };
  }

  private power(a: Coordinates, n: bigint): Coordinates {
    const { order, p, residueOrder: q } = this.ideal;
    const exponent = ((n % (q - 1n)) + q - 1n) % (q - 1n);
    return exponent === 0n ? this.one : order.power(a, exponent, p);
  }
}
