import type { Budget } from '../arith/budget';
import { distinctDegrees } from './distinct-degree';
import { equalDegreeFactors } from './equal-degree';
import { comparePolynomials } from './factor-finite';
import type { FiniteField } from './field';
import { withFinitePolynomials } from './finite-polynomials';
import { degree, type Polynomial } from './polynomial';

/**
 * An irreducible monic factor of least degree of a monic f of degree ≥ 1, or `undefined` when f is irreducible. Among the
 * factors of that degree it is the one with the least root for degree 1, and the least one for higher degree, coefficients
 * compared from the top in the order of the field.
 */
export function leastFactor<E>(
  field: FiniteField<E>,
  f: Polynomial<E>,
  budget: Budget,
  doing: string,
): Polynomial<E> | undefined {
  const spend = (): void => budget.spend(doing);
  const factors = withFinitePolynomials(field, spend, ({ ring, read, write }) => {
    const { value: part } = distinctDegrees(ring, read(f)).next();
    if (part === undefined || part.degree === degree(f)) return [];
    return equalDegreeFactors(ring, part, spend).map(write);
  });
  const root = (g: Polynomial<E>): bigint => field.index(field.negate(g[0]!));
  const [first, ...others] = factors;
  if (first === undefined) return undefined;
  return others.reduce(
    (best, g) => ((degree(g) === 1 ? root(g) < root(best) : comparePolynomials(field, g, best) < 0) ? g : best),
    first,
  );
}
