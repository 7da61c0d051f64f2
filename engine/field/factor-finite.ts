import type { Budget } from '../arith/budget';
import { distinctDegrees } from './distinct-degree';
import { equalDegreeFactors } from './equal-degree';
import type { FiniteField } from './field';
import { withFinitePolynomials, type FinitePolynomials } from './finite-polynomials';
import type { Polynomial } from './polynomial';
import { squareFreeParts } from './square-free';

/** unit · ∏ factor^exponent: the factors monic, irreducible and different. */
export interface PolynomialFactors<E> {
  readonly unit: E;
  readonly factors: readonly { readonly factor: Polynomial<E>; readonly exponent: number }[];
}

/**
 * The factorisation over 𝔽_q of f ≠ 0, q any prime power, ordered by degree and then by the coefficients from the top in the order
 * of the field. It is multiplied back before it is given. The same f always takes the same way. Throws a RangeError for 0.
 */
export function factorOverFinite<E>(
  field: FiniteField<E>,
  f: Polynomial<E>,
  budget: Budget,
  doing = `factoring a polynomial of degree ${f.length - 1} over ${field.name}`,
): PolynomialFactors<E> {
  if (f.length === 0) throw new RangeError('0 has no factorisation');
  const spend = (): void => budget.spend(doing);
  spend();
  const factors = withFinitePolynomials(field, spend, ({ ring, read, write }) =>
    factored(ring, ring.monic(read(f)), spend).map(({ factor, exponent }) => ({ factor: write(factor), exponent })),
  );
  factors.sort((a, b) => comparePolynomials(field, a.factor, b.factor));
  return { unit: f[f.length - 1]!, factors };
}

/** The irreducible factors of a monic f with their exponents, multiplied back, in no particular order. */
export function factored<P>(
  ring: FinitePolynomials<P>,
  f: P,
  spend: () => void,
): readonly { readonly factor: P; readonly exponent: number }[] {
  const factors = squareFreeParts(ring, f).flatMap(({ factor, exponent }) =>
    [...distinctDegrees(ring, factor)].flatMap((part) =>
      equalDegreeFactors(ring, part, spend).map((irreducible) => ({ factor: irreducible, exponent })),
    ),
  );
  const product = factors.reduce((value, { factor, exponent }) => {
    let power = value;
    for (let i = 0; i < exponent; i++) power = ring.multiply(power, factor);
    return power;
  }, ring.one);
  if (ring.degree(ring.subtract(product, f)) >= 0) throw new Error('the factors found do not multiply back');
  return factors;
}

/** The order of polynomials over a finite field: by degree, then by the coefficients from the top. */
export function comparePolynomials<E>(field: FiniteField<E>, f: Polynomial<E>, g: Polynomial<E>): number {
  if (f.length !== g.length) return f.length - g.length;
  for (let i = f.length - 1; i >= 0; i--) {
    const [a, b] = [field.index(f[i]!), field.index(g[i]!)];
    if (a !== b) return a < b ? -1 : 1;
  }
  return 0;
}
