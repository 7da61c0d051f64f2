import type { Budget } from '../arith/budget';
import { coprimeBase } from '../arith/coprime-base';
import { factor } from '../arith/factor';
import { valuation } from '../arith/valuation';
import { elementText } from '../expression/to-text';
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

/** Whether a sum of symbols (a, b) is zero in the Brauer group at every finite place of a number field. */
export const splitsAtFinitePlaces = (field: NumberField, symbols: readonly NumberSymbol[], budget: Budget): boolean =>
  ramifiedFinitePlace(field, symbols, budget) === undefined;

/**
 * A finite place of a number field at which a sum of symbols is not zero in the Brauer group, as it is written, or `undefined` when there is none.
 * Only the places above 2 and those where an entry has odd order can be. Primes ascend.
 */
export function ramifiedFinitePlace(
  field: NumberField,
  symbols: readonly NumberSymbol[],
  budget: Budget,
): string | undefined {
  const sum = symbolSum(field, symbols, budget);
  for (const p of primesInSight(sum.entries, budget)) {
    for (const prime of primesAbove(field.model.modulus, p, budget)) {
      if (sum.at(prime) === 1) return primeText(field, prime);
    }
  }
  return undefined;
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
  /** The exponent of −1 at a prime ideal. */
  at(prime: PrimeIdeal): 0 | 1;
}

export function symbolSum(field: NumberField, symbols: readonly NumberSymbol[], budget: Budget): SymbolSum {
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
    at(prime) {
      const place = numberPlace(prime);
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

const numberPlace = (prime: PrimeIdeal): NumberPlace =>
  prime.p === 2n ? dyadicNumberPlace(prime) : oddNumberPlace(prime);

/** 2 and the primes that divide a norm, ascending. */
function primesInSight(entries: readonly Entry[], budget: Budget): readonly bigint[] {
  const base = coprimeBase(entries.flatMap(({ constant, norm }) => [constant, norm]));
  const primes = new Set([2n]);
  for (const n of base) for (const { prime } of factor(n, budget)) primes.add(prime);
  return [...primes].sort((a, b) => (a < b ? -1 : a > b ? 1 : 0));
}

/** A prime ideal as it is written: (p, g) with g in the letter of the field, or by its numbers when p divides the index. */
function primeText(field: NumberField, prime: PrimeIdeal): string {
  const { p, generator, ramification, residueDegree, order } = prime;
  if (residueDegree === order.degree) return `(${p})`;
  if (generator === undefined) {
    return `a prime above ${p} of ramification index ${ramification} and residue degree ${residueDegree}`;
  }
  return `(${p}, ${elementText(field.write(field.model.element(generator, 1n)))})`;
}
