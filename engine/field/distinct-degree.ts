import type { FinitePolynomials } from './finite-polynomials';
import { Frobenius } from './frobenius';

/** A product of irreducible polynomials of one degree, with the Frobenius map modulo it. */
export interface DegreePart<P> {
  readonly product: P;
  readonly degree: number;
  readonly frobenius: Frobenius<P>;
}

/**
 * The products of the irreducible factors of f of each degree, ascending, for a monic f of degree ≥ 1; each factor stands in them
 * once, whatever its exponent in f. One at a time, so that whoever wants a factor of least degree stops at the first.
 *
 * x^(q^i) − x is the product of the monic irreducible polynomials whose degree divides i, so that what is left has no factor
 * of degree ≤ i after step i, and is irreducible when its degree is at most 2i + 1. D. Cantor, H. Zassenhaus, A new algorithm for factoring
 * polynomials over finite fields, Math. Comp. 36 (1981); M. Ben-Or, Probabilistic algorithms in finite fields, FOCS 1981.
 */
export function* distinctDegrees<P>(ring: FinitePolynomials<P>, f: P): Generator<DegreePart<P>> {
  let rest = f;
  let map = new Frobenius(ring, f);
  let reached = ring.degree(f);
  let image: P | undefined;
  for (let i = 1; 2 * i <= ring.degree(rest); i++) {
    image = image === undefined ? map.ofX() : map.apply(image);
    const common = ring.gcd(ring.divide(ring.subtract(image, ring.x), rest).remainder, rest);
    if (ring.degree(common) <= 0) continue;
    yield { product: common, degree: i, frobenius: map.modulo(common) };
    for (let shared = common; ring.degree(shared) > 0; shared = ring.gcd(rest, shared)) {
      rest = ring.divide(rest, shared).quotient;
    }
    // A matrix of the smaller size pays once the degree has fallen by a third.
    if (3 * ring.degree(rest) < 2 * reached && ring.degree(rest) > 0) {
      map = map.modulo(rest);
      image = ring.divide(image, rest).remainder;
      reached = ring.degree(rest);
    }
  }
  if (ring.degree(rest) > 0) yield { product: rest, degree: ring.degree(rest), frobenius: map };
}
