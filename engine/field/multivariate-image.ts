import { smallInverse, smallPower } from '../arith/modular';
import { seeded } from '../arith/seeded';
import { degreeIn, type LetterRing, type MultiPolynomial } from './multivariate';

/** A prime below 2^26: products of residues are exact as numbers. */
const PRIME = 67108859;
const LARGEST_DEGREE = 2_000;
const ATTEMPTS = 2;

/**
 * Whether two polynomials that are primitive in a letter are seen to be coprime: values for the other letters that keep both
 * degrees, and images in one letter over a prime field without a common root. `false` says nothing.
 */
export function coprimeByImage(ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial, letter: number): boolean {
  const p = ring.characteristic;
  // over a small field there are too few values
  if (p !== 0n && (p < 1000n || p > BigInt(PRIME))) return false;
  const q = p === 0n ? PRIME : Number(p);
  const [m, n] = [degreeIn(f, letter), degreeIn(g, letter)];
  if (m > LARGEST_DEGREE || n > LARGEST_DEGREE) return false;
  const stream = seeded(f.length * 31 + g.length);
  for (let attempt = 0; attempt < ATTEMPTS; attempt += 1) {
    ring.budget.spend('looking for common factors of polynomials');
    const values = ring.letters.map(() => Math.abs((stream() * 4294967296) % (q - 1)) + 1);
    const [a, b] = [imageIn(f, letter, values, q), imageIn(g, letter, values, q)];
    if (a.length - 1 === m && b.length - 1 === n && gcdDegree(a, b, q) === 0) return true;
  }
  return false;
}

/** The coefficients modulo q, from the constant term up, after values were put for all other letters. */
export function imageIn(f: MultiPolynomial, letter: number, values: readonly number[], q: number): number[] {
  const image: number[] = new Array<number>(degreeIn(f, letter) + 1).fill(0);
  for (const { exponents, coefficient } of f) {
    let value = Number(coefficient % BigInt(q));
    if (value < 0) value += q;
    exponents.forEach((e, i) => {
      if (i !== letter && e > 0) value = (value * smallPower(values[i] ?? 1, e, q)) % q;
    });
    const at = exponents[letter] ?? 0;
    image[at] = ((image[at] ?? 0) + value) % q;
  }
  while (image.length > 0 && image[image.length - 1] === 0) image.pop();
  return image;
}

/** The degree of the gcd of two polynomials over 𝔽_q, not both zero. */
function gcdDegree(f: number[], g: number[], q: number): number {
  let [a, b] = f.length >= g.length ? [f, g.slice()] : [g, f.slice()];
  while (b.length > 0) {
    const inverse = smallInverse(b[b.length - 1] ?? 1, q);
    const rest = a.slice();
    while (rest.length >= b.length) {
      const factor = ((rest[rest.length - 1] ?? 0) * inverse) % q;
      const shift = rest.length - b.length;
      for (let i = 0; i < b.length; i += 1) {
        const next = ((rest[shift + i] ?? 0) - ((factor * (b[i] ?? 0)) % q)) % q;
        rest[shift + i] = next < 0 ? next + q : next;
      }
      while (rest.length > 0 && rest[rest.length - 1] === 0) rest.pop();
    }
    [a, b] = [b, rest];
  }
  return a.length - 1;
}
