import type { Budget } from '../arith/budget';
import type { Graded, GradedRing } from './graded-ring';
import type { Term } from './term';

/** Evaluates a sum of terms in a ring. Nothing is expanded: each factor is evaluated, then multiplied in the ring. */
export function evaluate<A, H>(terms: readonly Term<A>[], ring: GradedRing<A, H>, budget: Budget): Graded<H> {
  const total: Graded<H> = new Map();
  for (const term of terms) {
    budget.spend('evaluating the words');
    addTerm(total, term, ring, budget);
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

/** Adds the value of a term: of one degree as long as its factors are symbols, graded from the first sum among them on. */
function addTerm<A, H>(total: Graded<H>, term: Term<A>, ring: GradedRing<A, H>, budget: Budget): void {
  let degree = -term.eta;
  let word = ring.integer(term.coefficient);
  if (term.eta > 0) word = times(0, word, degree, ring.eta(term.eta), ring);
  for (const entry of term.angles) word = times(degree, word, 0, ring.angle(entry), ring);
  let compound: Graded<H> | undefined;
  for (const factor of term.factors) {
    if (word === undefined) return;
    if (factor.kind === 'power') {
      const value = power(evaluate(factor.of, ring, budget), factor.exponent, ring, budget);
      compound = multiply(compound ?? new Map([[degree, word]]), value, ring, budget);
    } else if (compound === undefined) {
      word = times(degree, word, 1, ring.symbol(factor.entry), ring);
      degree += 1;
    } else {
      const symbol = ring.symbol(factor.entry);
      compound = symbol === undefined ? new Map() : multiply(compound, new Map([[1, symbol]]), ring, budget);
    }
    if (compound?.size === 0) return;
  }
  if (compound !== undefined) for (const [d, value] of compound) accumulate(total, d, value, ring);
  else if (word !== undefined) accumulate(total, degree, word, ring);
}

const times = <A, H>(
  m: number,
  x: H | undefined,
  n: number,
  y: H | undefined,
  ring: GradedRing<A, H>,
): H | undefined => (x === undefined || y === undefined ? undefined : ring.multiply(m, x, n, y));

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
