import { primesOf, squareFree, type Fraction } from './fraction';
import type { FreeWord } from './free-words';
import { hilbert, type Place } from './symbols';

/** Where rational forms are compared: over ℚ, ℝ, ℂ, or ℚ_p by its prime. */
export type RationalPlaces = 'Q' | 'R' | 'C' | bigint;

/** A diagonal form by how often each square-free integer stands in it; no count is negative. */
export type DiagonalForm = ReadonlyMap<bigint, bigint>;

/**
 * A representative in W(ℚ) of a sum of words under [a] ↦ ⟨a⟩ − 1, η ↦ 1: multiplied out, with −⟨a⟩ = ⟨−a⟩.
 */
export function diagonalForm(words: readonly FreeWord<Fraction>[]): DiagonalForm {
  const form = new Map<bigint, bigint>();
  for (const { coefficient, entries } of words) {
    const classes = entries.map(squareFree);
    for (let chosen = 0; chosen < 2 ** classes.length; chosen += 1) {
      const of = classes.filter((_, i) => (chosen >> i) % 2 === 1);
      const odd = (classes.length - of.length) % 2 === 1;
      const signed = odd ? -coefficient : coefficient;
      const value = of.reduce(productClass, signed < 0n ? -1n : 1n);
      form.set(value, (form.get(value) ?? 0n) + (signed < 0n ? -signed : signed));
    }
  }
  return form;
}

/** The product of two square-free integers modulo squares. */
function productClass(a: bigint, b: bigint): bigint {
  let [x, y] = [a < 0n ? -a : a, b < 0n ? -b : b];
  while (y !== 0n) [x, y] = [y, x % y];
  return (a / x) * (b / x);
}

/**
 * Whether a form is a sum of hyperbolic planes: even rank, trivial signed discriminant, signature 0 and, at every prime, the
 * Hasse invariant of so many planes (Hasse–Minkowski and Serre, A Course in Arithmetic, IV.2.3, Theorem 7).
 */
export function isHyperbolic(form: DiagonalForm, places: RationalPlaces): boolean {
  const total = (counts: Iterable<bigint>): bigint => [...counts].reduce((sum, m) => sum + m, 0n);
  const rank = total(form.values());
  if (rank % 2n !== 0n) return false;
  if (places === 'C') return true;
  const negative = total([...form].filter(([a]) => a < 0n).map(([, m]) => m));
  if (places === 'R') return 2n * negative === rank;
  let discriminant = (rank / 2n) % 2n === 0n ? 1n : -1n;
  for (const [a, m] of form) if (m % 2n === 1n) discriminant = productClass(discriminant, a);
  if (places !== 'Q') return isLocalSquare(discriminant, places) && hasPlanesHasse(form, rank, places);
  const primes = new Set([2n, ...[...form.keys()].flatMap(primesOf)]);
  return discriminant === 1n && 2n * negative === rank && [...primes].every((p) => hasPlanesHasse(form, rank, p));
}

/** Whether a square-free integer is a square in ℚ_p: its Hilbert symbols with a set of generators of ℚ_p^×/² are all 1. */
function isLocalSquare(a: bigint, p: Place): boolean {
  const generators = p === 2n ? [-1n, 2n, 5n] : [p, ...smallUnits(p)];
  return generators.every((b) => hilbert(a, b, p) === 1);
}

/** Small integers among which there is a non-residue modulo p. */
const smallUnits = (p: bigint): readonly bigint[] =>
  Array.from({ length: 200 }, (_, i) => BigInt(i) + 2n).filter((n) => n % p !== 0n);

function hasPlanesHasse(form: DiagonalForm, rank: bigint, p: Place): boolean {
  const entries = [...form];
  const triangular = (m: bigint): bigint => (m * (m - 1n)) / 2n;
  let symbol = 1;
  entries.forEach(([a, m], i) => {
    if (triangular(m) % 2n === 1n) symbol *= hilbert(a, a, p);
    for (const [b, n] of entries.slice(i + 1)) if ((m * n) % 2n === 1n) symbol *= hilbert(a, b, p);
  });
  return symbol === (triangular(rank / 2n) % 2n === 1n ? hilbert(-1n, -1n, p) : 1);
}
