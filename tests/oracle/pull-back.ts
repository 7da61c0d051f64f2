import type { Expression } from '@/engine/expression/expression';
import { diagonalForm, isHyperbolic, type RationalPlaces } from './diagonal-forms';
import { exponentIn, fraction, powerMod, primesOf, raised, times, valueOf, type Fraction } from './fraction';
import { differenceByDegree, freeWords, type FreeWord } from './free-words';
import { hilbert, tame } from './symbols';

/** What a slow decision finds: equality, and equality in Milnor K-theory and in the Witt ring alone. */
export interface Decided {
  readonly equal: boolean;
  readonly modEta: boolean;
  readonly modH: boolean;
}

/**
 * Decides left = right in K^MW_*(F) for F = ℚ, ℝ, ℂ or ℚ_p and rational entries, directly by the pull-back theorem (F. Morel,
 * Comment. Math. Helv. 79, 2004): in Milnor K-theory by symbols, in the Witt ring by multiplying out into diagonal forms and
 * their classical invariants (J.-P. Serre, A Course in Arithmetic, IV.2–IV.3; T. Y. Lam, Introduction to Quadratic Forms over
 * Fields, VI). It shares nothing with the engine but the tree it reads.
 */
export function decideRational(places: RationalPlaces, left: Expression, right: Expression): Decided {
  const minusOne = fraction(-1n);
  const words = (e: Expression): readonly FreeWord<Fraction>[] => freeWords(e, unit, minusOne);
  let [modEta, modH] = [true, true];
  for (const [degree, difference] of differenceByDegree(words(left), words(right))) {
    modEta &&= vanishesModEta(places, degree, difference);
    modH &&= isHyperbolic(diagonalForm(difference), places);
  }
  return { equal: modEta && modH, modEta, modH };
}

function unit(entry: Parameters<typeof valueOf>[0]): Fraction {
  const value = valueOf(entry);
  if (value.num === 0n) throw new RangeError('an entry is zero');
  return value;
}

/** Whether the image in K^M_n(F) is zero, up to uniquely divisible groups for ℝ, ℂ, ℚ_p, which rational symbols do not meet. */
function vanishesModEta(places: RationalPlaces, degree: number, words: readonly FreeWord<Fraction>[]): boolean {
  const symbols = words.filter(({ eta }) => eta === 0);
  if (degree < 0) return true;
  if (degree === 0) return symbols.reduce((sum, { coefficient }) => sum + coefficient, 0n) === 0n;
  if (degree === 1) {
    const product = symbols.reduce(
      (value, { coefficient, entries }) => times(value, raised(entries[0] ?? fraction(1n), coefficient)),
      fraction(1n),
    );
    return product.num === 1n && product.den === 1n;
  }
  if (places === 'C') return true;
  const realSign = symbols.filter(
    ({ coefficient, entries }) => coefficient % 2n !== 0n && entries.every(({ num }) => num < 0n),
  );
  const real = realSign.length % 2 === 0;
  if (places === 'R') return real;
  if (places === 'Q') return real && (degree > 2 || primesIn(symbols).every((p) => tameVanishes(symbols, p)));
  if (degree > 2) return true;
  return places === 2n ? dyadicVanishes(symbols) : tameVanishes(symbols, places);
}

const primesIn = (words: readonly FreeWord<Fraction>[]): readonly bigint[] => [
  ...new Set(words.flatMap(({ entries }) => entries.flatMap(({ num, den }) => [...primesOf(num), ...primesOf(den)]))),
];

function tameVanishes(words: readonly FreeWord<Fraction>[], p: bigint): boolean {
  let product = 1n;
  for (const { coefficient, entries } of words) {
    const [a, b] = entries;
    if (a === undefined || b === undefined) continue;
    const exponent = p === 2n ? 0n : ((coefficient % (p - 1n)) + p - 1n) % (p - 1n);
    product = (product * powerMod(tame(a, b, p), exponent, p)) % p;
  }
  return product === 1n;
}

/** K_2(ℚ_2) is {±1} by Hilbert's symbol, plus a uniquely divisible group. */
function dyadicVanishes(words: readonly FreeWord<Fraction>[]): boolean {
  let symbol = 1;
  for (const { coefficient, entries } of words) {
    const [a, b] = entries;
    if (a === undefined || b === undefined || coefficient % 2n === 0n) continue;
    symbol *= hilbert(a.num * a.den, b.num * b.den, 2n);
  }
  return symbol === 1;
}

/** The same over a prime field 𝔽_p: K^M_1 is the units, K^M_n = 0 for n ≥ 2; forms have rank and discriminant. */
export function decidePrimeField(p: bigint, left: Expression, right: Expression): Decided {
  const read = (entry: Parameters<typeof valueOf>[0]): bigint => {
    const { num, den } = unit(entry);
    if (exponentIn(num, p) > 0 || exponentIn(den, p) > 0) throw new RangeError('an entry is no unit');
    return (((num * powerMod(den, p === 2n ? 1n : p - 2n, p)) % p) + p) % p;
  };
  const words = (e: Expression): readonly FreeWord<bigint>[] => freeWords(e, read, p - 1n);
  const isSquare = (u: bigint): boolean => p === 2n || powerMod(u, (p - 1n) / 2n, p) === 1n;
  let [modEta, modH] = [true, true];
  for (const [degree, difference] of differenceByDegree(words(left), words(right))) {
    const symbols = difference.filter(({ eta }) => eta === 0);
    if (degree === 0) modEta &&= symbols.reduce((sum, { coefficient }) => sum + coefficient, 0n) === 0n;
    if (degree === 1 && p > 2n) {
      const power = (c: bigint): bigint => ((c % (p - 1n)) + p - 1n) % (p - 1n);
      modEta &&=
        symbols.reduce(
          (u, { coefficient, entries }) => (u * powerMod(entries[0] ?? 1n, power(coefficient), p)) % p,
          1n,
        ) === 1n;
    }
    // ∏(⟨aᵢ⟩ − 1) as squares and non-squares: multiplicities of ⟨1⟩ and ⟨s⟩ after −⟨a⟩ = ⟨−a⟩
    const count = new Map<boolean, bigint>([
      [true, 0n],
      [false, 0n],
    ]);
    for (const { coefficient, entries } of difference)
      for (let chosen = 0; chosen < 2 ** entries.length; chosen += 1) {
        const of = entries.filter((_, i) => (chosen >> i) % 2 === 1);
        const negative = (entries.length - of.length) % 2 === 1 ? coefficient > 0n : coefficient < 0n;
        const value = of.reduce((u, a) => (u * a) % p, negative ? p - 1n : 1n);
        const size = coefficient < 0n ? -coefficient : coefficient;
        count.set(isSquare(value), (count.get(isSquare(value)) ?? 0n) + size);
      }
    const [squares, others] = [count.get(true) ?? 0n, count.get(false) ?? 0n];
    const rank = squares + others;
    const sign = ((rank / 2n) % 2n === 0n || isSquare(p - 1n)) === (others % 2n === 0n);
    modH &&= rank % 2n === 0n && sign;
  }
  return { equal: modEta && modH, modEta, modH };
}
