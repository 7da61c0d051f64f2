import type { FinitePolynomials } from './finite-polynomials';

/** A square-free part of a polynomial with the exponent it stands in it with. */
export interface Power<P> {
  readonly factor: P;
  readonly exponent: number;
}

/**
 * Monic square-free polynomials, pairwise coprime, whose powers multiply to the monic f; for f = 1 there are none. Over a perfect
 * field of characteristic p: f/gcd(f, f′) holds the factors whose exponent p does not divide, and what is left when these are
 * taken out is a p-th power. D. Yun, On square-free decomposition algorithms (1976); Cohen, Algorithm 3.4.2 (number from memory).
 */
export function squareFreeParts<P>(ring: FinitePolynomials<P>, f: P): readonly Power<P>[] {
  const parts: Power<P>[] = [];
  let rest = f;
  for (let power = 1; ring.degree(rest) > 0; power *= Number(ring.characteristic)) {
    const quotient = (a: P, b: P): P => ring.divide(a, b).quotient;
    let deeper = ring.gcd(rest, ring.derivative(rest));
    let here = quotient(rest, deeper);
    for (let exponent = power; ring.degree(here) > 0; exponent += power) {
      const next = ring.degree(deeper) > 0 ? ring.gcd(here, deeper) : ring.one;
      const factor = ring.degree(next) > 0 ? quotient(here, next) : here;
      if (ring.degree(factor) > 0) parts.push({ factor, exponent });
      here = next;
      deeper = quotient(deeper, next);
    }
    if (ring.degree(deeper) <= 0) break;
    rest = ring.root(deeper);
  }
  return parts;
}
