import { seeded } from '../arith/seeded';
import type { DegreePart } from './distinct-degree';
import type { FinitePolynomials } from './finite-polynomials';
import { powerOf, type Frobenius } from './frobenius';

/**
 * The irreducible factors, in no particular order, of a product of different monic irreducible polynomials of one degree.
 *
 * The trace r + r^q + … + r^(q^(d−1)) is an element of 𝔽_q modulo each of them; its power (q − 1)/2 is 1 modulo about half of
 * them, and in characteristic 2 its trace down to 𝔽_2 is 0 modulo about half. Cantor–Zassenhaus, with the trace in place
 * of the long power: J. von zur Gathen, V. Shoup, Computing Frobenius maps and factoring polynomials (1992). The trial polynomials come from a
 * fixed stream; `spend` is called once a trial.
 */
export function equalDegreeFactors<P>(
  ring: FinitePolynomials<P>,
  part: DegreePart<P>,
  spend: () => void,
): readonly P[] {
  const stream = seeded(ring.degree(part.product));
  const found: P[] = [];
  const open: (readonly [P, Frobenius<P>])[] = [[part.product, part.frobenius]];
  for (let next = open.pop(); next !== undefined; next = open.pop()) {
    const [f, map] = next;
    if (ring.degree(f) === part.degree) {
      found.push(f);
      continue;
    }
    const multiply = ring.multiplyModulo(f);
    for (;;) {
      spend();
      const r = ring.draw(ring.degree(f), stream);
      const common = ring.gcd(splitter(ring, trace(ring, r, map, part.degree), multiply), f);
      if (ring.degree(common) <= 0 || ring.degree(common) === ring.degree(f)) continue;
      for (const factor of [common, ring.divide(f, common).quotient]) {
        open.push([factor, ring.degree(factor) === part.degree ? map : map.modulo(factor)]);
      }
      break;
    }
  }
  return found;
}

function trace<P>(ring: FinitePolynomials<P>, r: P, map: Frobenius<P>, degree: number): P {
  let sum = r;
  for (let i = 1, image = r; i < degree; i++) {
    image = map.apply(image);
    sum = ring.add(sum, image);
  }
  return sum;
}

/** A polynomial that vanishes modulo about half of the factors, t an element of 𝔽_q modulo each. */
function splitter<P>(ring: FinitePolynomials<P>, t: P, multiply: (f: P, g: P) => P): P {
  if (ring.degree(t) <= 0) return t;
  if (ring.characteristic !== 2n) return ring.subtract(powerOf(multiply, t, (ring.order - 1n) / 2n), ring.one);
  let sum = t;
  for (let power = t, reached = 2n; reached < ring.order; reached *= 2n) {
    power = multiply(power, power);
    sum = ring.add(sum, power);
  }
  return sum;
}
