import { exponentIn, powerMod, type Fraction } from './fraction';

/** Legendre's symbol (u/p) by Euler's criterion, p odd and not dividing u. */
const legendre = (u: bigint, p: bigint): 1 | -1 => (powerMod(u, (p - 1n) / 2n, p) === 1n ? 1 : -1);

/** A place of ℚ: a prime, or 0n for the real one. */
export type Place = bigint;

/**
 * Hilbert's symbol (a, b) at a place, for integers a, b ≠ 0: the formulas of J.-P. Serre, A Course in Arithmetic, III.1.2,
 * Theorem 1.
 */
export function hilbert(a: bigint, b: bigint, place: Place): 1 | -1 {
  if (place === 0n) return a < 0n && b < 0n ? -1 : 1;
  const p = place;
  const [alpha, beta] = [exponentIn(a, p), exponentIn(b, p)];
  const [u, v] = [a / p ** BigInt(alpha), b / p ** BigInt(beta)];
  if (p === 2n) {
    const odd = (x: bigint): boolean => x % 2n !== 0n;
    const epsilon = (x: bigint): boolean => odd((x - 1n) / 2n);
    const omega = (x: bigint): boolean => odd((x * x - 1n) / 8n);
    let minus = epsilon(u) && epsilon(v);
    if (alpha % 2 === 1 && omega(v)) minus = !minus;
    if (beta % 2 === 1 && omega(u)) minus = !minus;
    return minus ? -1 : 1;
  }
  let symbol = alpha % 2 === 1 && beta % 2 === 1 && p % 4n === 3n ? -1 : 1;
  if (beta % 2 === 1) symbol *= legendre(u, p);
  if (alpha % 2 === 1) symbol *= legendre(v, p);
  return symbol === 1 ? 1 : -1;
}

/**
 * The tame symbol (−1)^(αβ) a^β / b^α in 𝔽_p^×, as 1 … p − 1 (J. Milnor, Introduction to Algebraic K-Theory, §11, in his
 * convention): a homomorphism on K_2(ℚ).
 */
export function tame(a: Fraction, b: Fraction, p: bigint): bigint {
  const order = (x: Fraction): number => exponentIn(x.num, p) - exponentIn(x.den, p);
  const unit = (x: Fraction): bigint => {
    const top = x.num / p ** BigInt(exponentIn(x.num, p));
    const bottom = x.den / p ** BigInt(exponentIn(x.den, p));
    return (((top * powerMod(bottom, p - 2n, p)) % p) + p) % p;
  };
  const [alpha, beta] = [order(a), order(b)];
  // the powers of p cancel, so the units alone decide
  const power = (u: bigint, e: number): bigint => powerMod(u, ((BigInt(e) % (p - 1n)) + p - 1n) % (p - 1n), p);
  const size = p === 2n ? 1n : (power(unit(a), beta) * power(unit(b), -alpha)) % p;
  return (alpha * beta) % 2 === 0 ? size : (p - size) % p === 0n ? size : p - size;
}
