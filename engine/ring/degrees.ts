import { checkDegree } from './limits';
import type { Term } from './term';

/** The degrees of the words a sum of terms multiplies out to. */
export function degreesOf<A>(terms: readonly Term<A>[]): ReadonlySet<number> {
  const degrees = new Set<number>();
  for (const term of terms) for (const degree of degreesOfTerm(term)) degrees.add(degree);
  return degrees;
}

function degreesOfTerm<A>(term: Term<A>): Iterable<number> {
  let plain = -term.eta;
  let degrees: ReadonlySet<number> | undefined;
  for (const factor of term.factors) {
    if (factor.kind === 'symbol') plain += 1;
    else degrees = sums(degrees, multiples(degreesOf(factor.of), factor.exponent));
  }
  if (degrees === undefined) return [plain];
  return [...degrees].map((degree) => degree + plain);
}

function multiples(degrees: ReadonlySet<number>, times: number): ReadonlySet<number> {
  let result: ReadonlySet<number> | undefined;
  for (let i = 0; i < times; i += 1) result = sums(result, degrees);
  return result ?? new Set([0]);
}

function sums(x: ReadonlySet<number> | undefined, y: ReadonlySet<number>): ReadonlySet<number> {
  if (x === undefined) return y;
  const result = new Set<number>();
  for (const a of x) for (const b of y) result.add(a + b);
  for (const degree of result) checkDegree(degree);
  return result;
}
