import type { Budget } from '../arith/budget';
import { smallPrimes } from '../arith/small-primes';
import type { FiniteField } from './field';
import { leastFactor } from './irreducible';
import type { Polynomial } from './polynomial';

/**
 * The least monic irreducible polynomial of degree d ≥ 1 over a finite field: coefficients compared from the top, in the
 * order of the field. For d = 1 it is x itself.
 *
 * Binomials x^d + c come first and there may be as many of them as the field has elements, so that they are settled by
 * theorem: R. Lidl, H. Niederreiter, Finite Fields, Theorem 3.75. The others are tried one by one; about one in d is
 * irreducible.
 */
export function leastIrreducible<E>(field: FiniteField<E>, d: number, budget: Budget): Polynomial<E> {
  if (d === 1) return [field.zero, field.one];
  const doing = `looking for an irreducible polynomial of degree ${d} over ${field.name}`;
  const binomial = leastBinomial(field, d, () => budget.spend(doing));
  if (binomial !== undefined) return binomial;
  for (let index = field.order; ; index++) {
    if (index % field.order === 0n) continue;
    budget.spend(doing);
    const f: E[] = new Array<E>(d).fill(field.zero);
    for (let rest = index, i = 0; rest > 0n; rest /= field.order, i++) f[i] = field.element(rest % field.order);
    f.push(field.one);
    if (leastFactor(field, f, budget, doing) === undefined) return f;
  }
}

/**
 * The least irreducible x^d + c, if there is any. By the theorem x^d − a is irreducible over 𝔽_q iff every prime r dividing d
 * divides q − 1, a is no r-th power, and 4 | q − 1 when 4 | d. When the primes allow it, such a exist.
 */
function leastBinomial<E>(field: FiniteField<E>, d: number, spend: () => void): Polynomial<E> | undefined {
  const units = field.order - 1n;
  const primes = [...smallPrimes].filter((r) => d % r === 0).map(BigInt);
  if (primes.some((r) => units % r !== 0n) || (d % 4 === 0 && units % 4n !== 0n)) return undefined;
  for (let index = 1n; index <= units; index++) {
    spend();
    const c = field.element(index);
    const a = field.negate(c);
    if (primes.some((r) => field.equal(field.power(a, units / r), field.one))) continue;
    return [c, ...new Array<E>(d - 1).fill(field.zero), field.one];
  }
  return undefined;
}
