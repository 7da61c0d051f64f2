import type { Budget } from '../arith/budget';
import { modulo } from '../arith/modular';
import { Refusal } from '../expression/refusal';

/** Where polynomials in several letters live: ℤ[letters], or 𝔽_p[letters] for a prime characteristic p. */
export interface LetterRing {
  readonly letters: readonly string[];
  /** 0, or the prime p. */
  readonly characteristic: bigint;
  readonly budget: Budget;
}

/** A monomial with its coefficient, which is not zero; one exponent for each letter of the ring, in their order. */
export interface MultiTerm {
  readonly exponents: readonly number[];
  readonly coefficient: bigint;
}

/**
 * A polynomial in several letters: its terms, exponents falling in lexicographic order; zero has none. In characteristic p
 * coefficients lie in 1 … p − 1. Equal polynomials have equal lists.
 */
export type MultiPolynomial = readonly MultiTerm[];

/** Polynomials are not multiplied out past this many products of terms, nor kept with more terms. */
const PRODUCT_LIMIT = 400_000;
const TERM_LIMIT = 4_000;
/** Coefficients have at most 10⁵ digits, exponents at most six. */
const LARGEST = 10n ** 100_000n;
const EXPONENT_LIMIT = 1_000_000;

const tooMany = (): Refusal =>
  new Refusal('size', 'An entry has too many terms to multiply out. Use entries with smaller powers of sums.');

export function compareExponents(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < a.length; i += 1) {
    const difference = (a[i] ?? 0) - (b[i] ?? 0);
    if (difference !== 0) return difference;
  }
  return 0;
}

/** A coefficient in canonical form. */
export const reduced = (ring: LetterRing, c: bigint): bigint =>
  ring.characteristic === 0n ? c : modulo(c, ring.characteristic);

/** Collects terms in any order, exponents repeated or not. */
export function collected(ring: LetterRing, terms: Iterable<MultiTerm>): MultiPolynomial {
  const sums = new Map<string, { exponents: readonly number[]; coefficient: bigint }>();
  for (const { exponents, coefficient } of terms) {
    const key = exponents.join();
    const present = sums.get(key);
    if (present === undefined) sums.set(key, { exponents, coefficient });
    else present.coefficient += coefficient;
  }
  const result: MultiTerm[] = [];
  for (const { exponents, coefficient } of sums.values()) {
    const c = reduced(ring, coefficient);
    if (c === 0n) continue;
    if (c > LARGEST || c < -LARGEST)
      throw new Refusal('size', 'A coefficient of an entry has more than 100000 digits. Use smaller numbers.');
    result.push({ exponents, coefficient: c });
  }
  if (result.length > TERM_LIMIT) throw tooMany();
  return result.sort((a, b) => compareExponents(b.exponents, a.exponents));
}

export const constantPolynomial = (ring: LetterRing, c: bigint): MultiPolynomial =>
  collected(ring, [{ exponents: ring.letters.map(() => 0), coefficient: c }]);

/** letter^exponent, the letter given by its place. */
export const letterPower = (ring: LetterRing, letter: number, exponent = 1): MultiPolynomial => {
  if (exponent > EXPONENT_LIMIT)
    throw new Refusal('size', 'An exponent inside a sum is past 1000000. Use smaller exponents.');
  return [{ exponents: ring.letters.map((_, i) => (i === letter ? exponent : 0)), coefficient: 1n }];
};

export const isConstant = (f: MultiPolynomial): boolean =>
  f.length === 0 || (f.length === 1 && (f[0]?.exponents.every((e) => e === 0) ?? true));

export const addMulti = (ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial): MultiPolynomial =>
  f.length === 0 ? g : g.length === 0 ? f : collected(ring, [...f, ...g]);

export const negateMulti = (ring: LetterRing, f: MultiPolynomial): MultiPolynomial => scaleMulti(ring, -1n, f);

export function scaleMulti(ring: LetterRing, c: bigint, f: MultiPolynomial): MultiPolynomial {
  const factor = reduced(ring, c);
  if (factor === 0n) return [];
  if (factor === 1n) return f;
  return f.map(({ exponents, coefficient }) => ({ exponents, coefficient: reduced(ring, coefficient * factor) }));
}

/** Work on so many terms: a step for each thousand, one at least. */
export function spendOn(ring: LetterRing, terms: number, doing: string): void {
  for (let done = 0; done <= terms; done += 1_000) ring.budget.spend(doing);
}

/** Refuses a product of too many terms. */
export function multiplyMulti(ring: LetterRing, f: MultiPolynomial, g: MultiPolynomial): MultiPolynomial {
  if (f.length * g.length > PRODUCT_LIMIT) throw tooMany();
  spendOn(ring, f.length * g.length, 'multiplying polynomials in several letters');
  return collected(ring, products(f, g));
}

function* products(f: MultiPolynomial, g: MultiPolynomial): Generator<MultiTerm> {
  for (const a of f)
    for (const b of g)
      yield {
        exponents: a.exponents.map((e, i) => e + (b.exponents[i] ?? 0)),
        coefficient: a.coefficient * b.coefficient,
      };
}

/** f^n for n ≥ 0. */
export function powerMulti(ring: LetterRing, f: MultiPolynomial, n: number): MultiPolynomial {
  if (f.length === 1 && f[0]?.coefficient === 1n && n > 1) {
    if (f[0].exponents.some((e) => e * n > EXPONENT_LIMIT)) throw tooMany();
    return [{ exponents: f[0].exponents.map((e) => e * n), coefficient: 1n }];
  }
  if (f.length > 1 && n >= TERM_LIMIT) throw tooMany();
  let result = constantPolynomial(ring, 1n);
  let square = f;
  for (let rest = n; rest > 0; rest = (rest - (rest % 2)) / 2) {
    if (rest % 2 === 1) result = multiplyMulti(ring, result, square);
    if (rest > 1) square = multiplyMulti(ring, square, square);
  }
  return result;
}

/** The degree in a letter; −1 for zero. */
export const degreeIn = (f: MultiPolynomial, letter: number): number =>
  f.reduce((most, { exponents }) => Math.max(most, exponents[letter] ?? 0), -1);

/** The letters that occur, by their places. */
export const lettersIn = (ring: LetterRing, f: MultiPolynomial): readonly number[] =>
  ring.letters.flatMap((_, i) => (f.some(({ exponents }) => exponents[i] !== 0) ? [i] : []));

/** The coefficients as a polynomial in one letter, by exponent, those that are zero left out. */
export function coefficientsIn(f: MultiPolynomial, letter: number): ReadonlyMap<number, MultiPolynomial> {
  const byExponent = new Map<number, MultiTerm[]>();
  for (const { exponents, coefficient } of f) {
    const e = exponents[letter] ?? 0;
    const term = { exponents: exponents.map((other, i) => (i === letter ? 0 : other)), coefficient };
    const list = byExponent.get(e);
    if (list === undefined) byExponent.set(e, [term]);
    else list.push(term); // setting one exponent to 0 keeps the order of the others
  }
  return byExponent;
}

/** The coefficient of the highest power of a letter. */
export const leadingIn = (f: MultiPolynomial, letter: number): MultiPolynomial =>
  coefficientsIn(f, letter).get(degreeIn(f, letter)) ?? [];

/** A name of a polynomial: equal polynomials have equal names. */
export const keyOf = (f: MultiPolynomial): string =>
  f.map(({ exponents, coefficient }) => `${coefficient}:${exponents.join()}`).join(';');

/** The derivative along a letter. */
export const derivativeIn = (ring: LetterRing, f: MultiPolynomial, letter: number): MultiPolynomial =>
  collected(
    ring,
    f.flatMap(({ exponents, coefficient }) => {
      const e = exponents[letter] ?? 0;
      return e === 0
        ? []
        : [{ exponents: exponents.map((x, i) => (i === letter ? x - 1 : x)), coefficient: coefficient * BigInt(e) }];
    }),
  );
