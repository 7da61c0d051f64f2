import { multiplyInt, type Int } from '../arith/int';
import { boundedCoefficient } from './limits';

/**
 * The kernel form of an expression, in which rings are evaluated: a sum of terms
 *
 *   coefficient · η^eta · ∏⟨angles⟩ · factors in order,
 *
 * where η and ⟨a⟩ have been moved to the front, since both are central (F. Morel, A¹-Algebraic Topology over a Field, LNM 2052,
 * Lemma 3.5, number from memory).
 */
export interface Term<A> {
  readonly coefficient: Int;
  readonly eta: number;
  readonly angles: readonly A[];
  readonly factors: readonly Factor<A>[];
}

export type Factor<A> =
  | { readonly kind: 'symbol'; readonly entry: A }
  | { readonly kind: 'power'; readonly of: readonly Term<A>[]; readonly exponent: number };

const none: readonly never[] = [];

export const constantTerm = <A>(coefficient: Int): Term<A> => ({ coefficient, eta: 0, angles: none, factors: none });

/** The product of terms, in order. */
export function multiplyAll<A>(terms: readonly Term<A>[]): Term<A> {
  let coefficient: Int = 1;
  let eta = 0;
  const angles: A[] = [];
  const factors: Factor<A>[] = [];
  for (const term of terms) {
    coefficient = boundedCoefficient(multiplyInt(coefficient, term.coefficient));
    eta += term.eta;
    for (const angle of term.angles) angles.push(angle);
    for (const factor of term.factors) factors.push(factor);
  }
  return { coefficient, eta, angles, factors };
}

/** Calls `visit` for the entries that occur in a term, with repetitions. */
export function forEachEntry<A>(term: Term<A>, visit: (entry: A) => void): void {
  for (const entry of term.angles) visit(entry);
  for (const factor of term.factors) {
    if (factor.kind === 'symbol') visit(factor.entry);
    else for (const inner of factor.of) forEachEntry(inner, visit);
  }
}

/** The least and the greatest degree of a product of terms; exact for a word of symbols, an outer bound otherwise. */
export function degreeRange<A>(term: Term<A>): readonly [number, number] {
  let low = -term.eta;
  let high = -term.eta;
  for (const factor of term.factors) {
    if (factor.kind === 'symbol') {
      low += 1;
      high += 1;
      continue;
    }
    let [innerLow, innerHigh] = [Infinity, -Infinity];
    for (const inner of factor.of) {
      const [l, h] = degreeRange(inner);
      innerLow = Math.min(innerLow, l);
      innerHigh = Math.max(innerHigh, h);
    }
    if (factor.of.length > 0) {
      low += innerLow * factor.exponent;
      high += innerHigh * factor.exponent;
    }
  }
  return [low, high];
}
