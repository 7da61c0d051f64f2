import { gcd } from '../arith/gcd';
import { modulo } from '../arith/modular';
import { rationalFromResidue } from '../arith/rational-reconstruction';
import type { IntegerPolynomial } from './integer-polynomial';
import { multiplyModuloMonic } from './integer-residues';
import { residuesModulo } from './modular-gcd';
import { invertPolynomial } from './polynomial';
import { primeField } from './prime-field';
import { wordPrime } from './word-primes';

/**
 * The inverse of f modulo a monic irreducible polynomial over ℤ that does not divide f, as numerator/denominator: modulo a prime by Euclid's
 * algorithm, then modulo its powers by Newton's iteration, until fractions found in the residues are seen to be the inverse.
 * J. Dixon, Exact solution of linear equations using p-adic expansions, Numer. Math. 40 (1982).
 */
export function inverseModuloMonic(
  f: IntegerPolynomial,
  monic: IntegerPolynomial,
): { readonly numerator: IntegerPolynomial; readonly denominator: bigint } {
  for (let place = 0; ; place++) {
    const p = wordPrime(place);
    const field = primeField(BigInt(p));
    const [image, modulus] = [f, monic].map((g) => residuesModulo(g, p).map(BigInt));
    const start = image!.length === 0 ? undefined : invertPolynomial(field, image!, modulus!);
    if (start !== undefined) return lifted(f, monic, start, BigInt(p));
  }
}

function lifted(
  f: IntegerPolynomial,
  monic: IntegerPolynomial,
  start: IntegerPolynomial,
  p: bigint,
): { readonly numerator: IntegerPolynomial; readonly denominator: bigint } {
  let inverse = start;
  for (let m = p; ; m *= m) {
    const found = fractions(inverse, m);
    if (found !== undefined) {
      const product = multiplyModuloMonic(f, found.numerator, monic);
      if (product.length === 1 && product[0] === found.denominator) return found;
    }
    // x(2 − fx)
    const defect = multiplyModuloMonic(f, inverse, monic).map((c) => -c);
    defect[0] = (defect[0] ?? 0n) + 2n;
    inverse = multiplyModuloMonic(inverse, defect, monic).map((c) => modulo(c, m * m));
  }
}

/** Fractions of small numerators and a common denominator that are these residues, if there seem to be any. */
function fractions(
  residues: IntegerPolynomial,
  m: bigint,
): { readonly numerator: IntegerPolynomial; readonly denominator: bigint } | undefined {
  let denominator = 1n;
  for (const c of residues) {
    const found = rationalFromResidue(c * denominator, m);
    if (found === undefined) return undefined;
    denominator *= found.den;
  }
  const numerator = residues.map((c) => {
    const r = modulo(c * denominator, m);
    return 2n * r > m ? r - m : r;
  });
  const common = numerator.reduce((divisor, c) => gcd(divisor, c), denominator);
  return { numerator: numerator.map((c) => c / common), denominator: denominator / common };
}
