import type { Budget } from '../arith/budget';
import { randomBetween, seeded } from '../arith/seeded';
import type { FiniteField } from './field';
import {
  addPolynomials,
  degree,
  dividePolynomials,
  gcdPolynomials,
  multiplyPolynomials,
  powerPolynomial,
  remainderPolynomial,
  subtractPolynomials,
  trimmed,
  type Polynomial,
} from './polynomial';

/**
 * An irreducible monic factor of least degree of a monic f of degree ≥ 1, or `undefined` when f is irreducible. Among the
 * factors of that degree it is the one with the least root for degree 1, and the least one for higher degree, coefficients
 * compared from the top in the order of the field.
 *
 * M. Ben-Or, Probabilistic algorithms in finite fields, FOCS 1981: f is irreducible iff gcd(f, x^(q^i) − x) = 1 for
 * i = 1 … ⌊deg f / 2⌋, because x^(q^i) − x is the product of the monic irreducible polynomials whose degree divides i.
 */
export function leastFactor<E>(
  field: FiniteField<E>,
  f: Polynomial<E>,
  budget: Budget,
  doing: string,
): Polynomial<E> | undefined {
  const x: Polynomial<E> = [field.zero, field.one];
  const spend = (): void => budget.spend(doing);
  let frobenius = x;
  for (let i = 1; 2 * i <= degree(f); i++) {
    frobenius = powerPolynomial(field, frobenius, field.order, f, spend);
    const common = gcdPolynomials(field, subtractPolynomials(field, frobenius, x), f);
    if (degree(common) > 0) return least(field, equalDegreeFactors(field, common, i, spend));
  }
  return undefined;
}

function least<E>(field: FiniteField<E>, polynomials: readonly Polynomial<E>[]): Polynomial<E> {
  const place = (f: Polynomial<E>): bigint =>
    degree(f) === 1
      ? field.index(field.negate(f[0]!))
      : f.reduceRight((value, c) => value * field.order + field.index(c), 0n);
  return polynomials.reduce((best, f) => (place(f) < place(best) ? f : best));
}

/**
 * The irreducible factors of a monic square-free f all of whose irreducible factors have degree i. D. Cantor,
 * H. Zassenhaus, A new algorithm for factoring polynomials over finite fields, Math. Comp. 36 (1981); Cohen, Algorithms
 * 3.4.6 and 3.4.8 (numbers from memory). The trial polynomials come from a fixed stream.
 */
function equalDegreeFactors<E>(
  field: FiniteField<E>,
  f: Polynomial<E>,
  i: number,
  spend: () => void,
): readonly Polynomial<E>[] {
  if (degree(f) === i) return [f];
  const stream = seeded(degree(f));
  for (;;) {
    const trial = trimmed(
      field,
      Array.from({ length: degree(f) }, () => field.element(randomBetween(0n, field.order - 1n, stream))),
    );
    const common = gcdPolynomials(field, splitter(field, trial, f, i, spend), f);
    if (degree(common) < 1 || degree(common) === degree(f)) continue;
    const other = dividePolynomials(field, f, common).quotient;
    return [...equalDegreeFactors(field, common, i, spend), ...equalDegreeFactors(field, other, i, spend)];
  }
}

/** A polynomial that vanishes modulo about half of the factors of f: r^((q^i−1)/2) − 1, in characteristic 2 the trace of r. */
function splitter<E>(
  field: FiniteField<E>,
  r: Polynomial<E>,
  f: Polynomial<E>,
  i: number,
  spend: () => void,
): Polynomial<E> {
  const size = field.order ** BigInt(i);
  if (field.characteristic !== 2n) {
    return subtractPolynomials(field, powerPolynomial(field, r, (size - 1n) / 2n, f, spend), [field.one]);
  }
  let trace = r;
  let square = r;
  for (let reached = 2n; reached < size; reached *= 2n) {
    spend();
    square = remainderPolynomial(field, multiplyPolynomials(field, square, square), f);
    trace = addPolynomials(field, trace, square);
  }
  return trace;
}
