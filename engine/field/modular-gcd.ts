import { gcd } from '../arith/gcd';
import { smallInverse } from '../arith/modular';
import { derivativeInteger, exactQuotient, primitivePart, type IntegerPolynomial } from './integer-polynomial';
import { SmallPrimePolynomials } from './small-prime-polynomials';
import type { Power } from './square-free';
import { wordPrime } from './word-primes';

/** The residues of an integer polynomial modulo a prime p < 2^31; zeros at the top are cut off. */
export function residuesModulo(f: IntegerPolynomial, p: number): readonly number[] {
  const modulus = BigInt(p);
  const residues = f.map((c) => {
    const r = Number(c % modulus);
    return r < 0 ? r + p : r;
  });
  while (residues.length > 0 && residues[residues.length - 1] === 0) residues.pop();
  return residues;
}

/**
 * The primitive greatest common divisor, with positive leading coefficient, of two primitive polynomials over ℤ.
 *
 * Modulo primes below 2^25, put together by the Chinese remainder theorem until the coefficients no longer change, and then checked by
 * division. W. Brown, On Euclid's algorithm and the computation of polynomial greatest common divisors, J. ACM 18 (1971);
 * J. von zur Gathen, J. Gerhard, Modern Computer Algebra, Algorithm 6.38 (number from memory). Two coprime polynomials are recognised by the
 * first prime as a rule.
 */
export function gcdIntegers(f: IntegerPolynomial, g: IntegerPolynomial, spend: () => void): IntegerPolynomial {
  if (f.length === 0 || g.length === 0) return f.length === 0 ? g : f;
  if (f.length === 1 || g.length === 1) return [1n];
  const lead = gcd(f[f.length - 1]!, g[g.length - 1]!);
  let modulus = 1n;
  let image: bigint[] = [];
  for (let place = 0; ; place++) {
    spend();
    const p = wordPrime(place);
    const leadModulo = Number(lead % BigInt(p));
    if (leadModulo === 0) continue;
    const ring = new SmallPrimePolynomials(p, spend);
    const common = ring.gcd(residuesModulo(f, p), residuesModulo(g, p));
    if (common.length === 1) return [1n];
    if (modulus !== 1n && common.length > image.length) continue;
    if (common.length < image.length) modulus = 1n;
    const scaled = common.map((c) => (c * leadModulo) % p);
    if (modulus === 1n) {
      image = scaled.map((c) => centred(BigInt(c), BigInt(p)));
      modulus = BigInt(p);
    } else {
      const changed = combine(image, modulus, scaled, p);
      modulus *= BigInt(p);
      if (changed) continue;
    }
    const candidate = primitivePart(image);
    if (exactQuotient(f, candidate, spend) !== undefined && exactQuotient(g, candidate, spend) !== undefined) {
      return candidate;
    }
  }
}

const centred = (c: bigint, m: bigint): bigint => (2n * c > m ? c - m : c);

/** Changes the coefficients, given modulo `modulus`, into those that are also right modulo p; whether any did change. */
function combine(image: bigint[], modulus: bigint, residues: readonly number[], p: number): boolean {
  const inverse = smallInverse(Number(modulus % BigInt(p)), p);
  let changed = false;
  for (let i = 0; i < image.length; i++) {
    const here = Number(image[i]! % BigInt(p));
    const difference = (((residues[i]! - here) % p) + p) % p;
    if (difference === 0) continue;
    changed = true;
    const digit = (difference * inverse) % p;
    image[i]! += modulus * BigInt(2 * digit > p ? digit - p : digit);
  }
  return changed;
}

/**
 * Primitive square-free polynomials over ℤ, pairwise coprime, whose powers multiply to the primitive f of positive leading
 * coefficient; for f = 1 there are none. D. Yun, On square-free decomposition algorithms (1976).
 */
export function squareFreeIntegers(f: IntegerPolynomial, spend: () => void): readonly Power<IntegerPolynomial>[] {
  const parts: Power<IntegerPolynomial>[] = [];
  const quotient = (a: IntegerPolynomial, b: IntegerPolynomial): IntegerPolynomial => {
    const found = b.length === 1 ? a : exactQuotient(a, b, spend);
    if (found === undefined) throw new Error('a common divisor that does not divide');
    return found;
  };
  let deeper = f.length > 1 ? gcdIntegers(f, primitivePart(derivativeInteger(f)), spend) : f;
  let here = quotient(f, deeper);
  for (let exponent = 1; here.length > 1; exponent++) {
    const next = gcdIntegers(here, deeper, spend);
    const factor = quotient(here, next);
    if (factor.length > 1) parts.push({ factor, exponent });
    here = next;
    deeper = quotient(deeper, next);
  }
  return parts;
}
