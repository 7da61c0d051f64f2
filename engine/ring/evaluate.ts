import type { Budget } from '../arith/budget';
import type { Graded, GradedRing } from './graded-ring';
import type { Term } from './term';

/** Evaluates a sum of terms in a ring. Nothing is expanded: each factor is evaluated, then multiplied in the ring. */
export function evaluate<A, H>(terms: readonly Term<A>[], ring: GradedRing<A, H>, budget: Budget): Graded<H> {
  const total: Graded<H> = new Map();
  for (const term of terms) {
    budget.spend('evaluating the words');
    for (const [degree, value] of evaluateTerm(term, ring, budget)) accumulate(total, degree, value, ring);
  }
  return total;
}

/** Adds a homogeneous value to an element in place. */
export function accumulate<A, H>(total: Graded<H>, degree: number, value: H, ring: GradedRing<A, H>): void {
  const present = total.get(degree);
  const next = present === undefined ? value : ring.add(degree, present, value);
  if (next === undefined) total.delete(degree);
  else total.set(degree, next);
}

function evaluateTerm<A, H>(term: Term<A>, ring: GradedRing<A, H>, budget: Budget): Iterable<readonly [number, H]> {
  let degree = 0;
  let word = ring.integer(term.coefficient);
  const times = (degreeY: number, y: H | undefined): void => {
    word = word === undefined || y === undefined ? undefined : ring.multiply(degree, word, degreeY, y);
    degree += degreeY;
  };
  if (term.eta > 0) times(-term.eta, ring.eta(term.eta));
  for (const entry of term.angles) times(0, ring.angle(entry));
  let compound: Graded<H> | undefined;
  for (const factor of term.factors) {
    if (word === undefined) return [];
    if (factor.kind === 'power') {
      const value = power(evaluate(factor.of, ring, budget), factor.exponent, ring, budget);
      compound = multiply(compound ?? new Map([[degree, word]]), value, ring, budget);
    } else if (compound === undefined) {
      times(1, ring.symbol(factor.entry));
    } else {
      const symbol = ring.symbol(factor.entry);
      compound = symbol === undefined ? new Map() : multiply(compound, new Map([[1, symbol]]), ring, budget);
    }
    if (compound?.size === 0) return [];
  }
  return compound ?? (word === undefined ? [] : [[degree, word]]);
}

function multiply<A, H>(x: Graded<H>, y: Graded<H>, ring: GradedRing<A, H>, budget: Budget): Graded<H> {
  const product: Graded<H> = new Map();
  for (const [degreeX, partX] of x) {
    budget.spend('multiplying out a product of sums');
    for (const [degreeY, partY] of y) {
      const part = ring.multiply(degreeX, partX, degreeY, partY);
      if (part !== undefined) accumulate(product, degreeX + degreeY, part, ring);
    }
  }
  return product;
}

/** base^exponent for exponent ≥ 1, by squaring. */
function power<A, H>(base: Graded<H>, exponent: number, ring: GradedRing<A, H>, budget: Budget): Graded<H> {
  let result: Graded<H> | undefined;
  let square = base;
  for (let rest = exponent; rest > 0; rest >>= 1) {
    if (rest & 1) result = result === undefined ? square : multiply(result, square, ring, budget);
    if (rest > 1) square = multiply(square, square, ring, budget);
  }
  return result ?? base;
}
