import type { Budget } from '../arith/budget';
import { coprimeBase } from '../arith/coprime-base';
import { factor } from '../arith/factor';
import { valuation } from '../arith/valuation';
import { content, type IntegerPolynomial } from '../field/integer-polynomial';
import { normOf } from '../field/integer-residues';
import type { NumberField, NumberFieldElement } from '../field/number-field';
import { primesAbove } from '../field/primes-above';
import type { PrimeIdeal } from '../field/prime-ideal';
import { dyadicNumberPlace } from './dyadic-number-place';
import type { NumberPlace } from './number-place';
import { oddNumberPlace } from './odd-number-place';

/** A symbol (a, b) of elements ≠ 0. */
export type NumberSymbol = readonly [NumberFieldElement, NumberFieldElement];

/** The finite places of a number field, each made once. */
export class FinitePlaces {
  private readonly above = new Map<bigint, readonly FinitePlace[]>();

  constructor(
    readonly field: NumberField,
    readonly budget: Budget,
  ) {}

  /** Those above a prime, in a fixed order. */
  at(p: bigint): readonly FinitePlace[] {
    const known = this.above.get(p);
    if (known !== undefined) return known;
    const made = primesAbove(this.field.model.modulus, p, this.budget).map((prime) => ({
      prime,
      place: p === 2n ? dyadicNumberPlace(prime) : oddNumberPlace(prime),
    }));
    this.above.set(p, made);
    return made;
  }
}

/** A finite place: its prime ideal, and what is known of squares there. */
export interface FinitePlace {
  readonly prime: PrimeIdeal;
  readonly place: NumberPlace;
}

/**
 * Whether a sum of symbols (a, b) is zero in the Brauer group at every finite place of a number field. Only the places above 2 and those where
 * an entry has odd order can be in the way.
 */
export function splitsAtFinitePlaces(places: FinitePlaces, symbols: readonly NumberSymbol[]): boolean {
  const sum = symbolSum(places, symbols);
  return primesInSight(sum.entries, places.budget).every((p) => places.at(p).every((place) => sum.at(place) === 0));
}

/** An entry as an algebraic integer in the same square class: constant · primitive, with the norm of the second factor. */
interface Entry {
  readonly primitive: IntegerPolynomial;
  readonly constant: bigint;
  readonly norm: bigint;
}

/** A sum of symbols at the finite places. */
interface SymbolSum {
  readonly entries: readonly Entry[];
  /** The exponent of −1 at a place. */
  at(place: FinitePlace): 0 | 1;
}

export function symbolSum({ field, budget }: FinitePlaces, symbols: readonly NumberSymbol[]): SymbolSum {
  const spend = (): void => budget.spend(`computing norms from ${field.name}`);
  const { model } = field;
  const numbers = new Map<NumberFieldElement, number>();
  const entries: Entry[] = [];
  const numberOf = (a: NumberFieldElement): number => {
    const known = numbers.get(a);
    if (known !== undefined) return known;
    const { numerator, denominator } = model.integral(a);
    const common = content(numerator);
    const primitive = numerator.map((c) => c / common);
    entries.push({ primitive, constant: common * denominator, norm: normOf(primitive, model.modulus, spend) });
    numbers.set(a, entries.length - 1);
    return entries.length - 1;
  };
  const pairs = symbols.map(([a, b]) => [numberOf(a), numberOf(b)] as const);
  return {
    entries,
    at({ prime, place }) {
      const classes: bigint[] = [];
      const classOf = (i: number): bigint => {
        const { primitive, constant, norm } = entries[i]!;
        // p^k divides the norm of an element of order k, and p has order e
        const { exponent } = valuation(norm, prime.p);
        const bound = exponent + prime.ramification * valuation(constant, prime.p).exponent + 1;
        return (classes[i] ??= place.classOf(
          primitive.map((c) => c * constant),
          bound,
        ));
      };
      return pairs.reduce<0 | 1>((sum, [i, j]) => (sum === place.hilbert(classOf(i), classOf(j)) ? 0 : 1), 0);
    },
  };
}

/** 2 and the primes that divide a norm, ascending. */
function primesInSight(entries: readonly Entry[], budget: Budget): readonly bigint[] {
  const base = coprimeBase(entries.flatMap(({ constant, norm }) => [constant, norm]));
  const primes = new Set([2n]);
  for (const n of base) for (const { prime } of factor(n, budget)) primes.add(prime);
  return [...primes].sort((a, b) => (a < b ? -1 : a > b ? 1 : 0));
}
