import type { Budget } from '../arith/budget';
import { Refusal } from '../expression/refusal';
import type { GradedRing } from './graded-ring';
import { boundedCoefficient } from './limits';
import { epsilonMultiple, multiplySign, reduceSign, type CharacteristicClass, type SignClass } from './sign-ring';

/** An entry ±∏ letters^exponent; letters are counted from 0, exponents that are 0 are left out. */
export interface Monomial {
  readonly negative: boolean;
  readonly exponents: ReadonlyMap<number, bigint>;
}

/**
 * A combination of canonical words b·[p_S]: the coefficient b in B_* for every set S of letters, S as a bit mask and
 * [p_S] = [p_i][p_j]… with i < j < …. The degree of b is that of the element less the number of letters in S.
 */
export type Words = ReadonlyMap<bigint, SignClass>;

/** More words than this are not kept. */
export const WORD_LIMIT = 5_000;

export const wordsRefusal = (): Refusal =>
  new Refusal('size', 'The canonical form has more than 5 000 words. Use entries with fewer letters.');

/**
 * Canonical words in ±monomials of letters: equal elements have the same words, over every field at once. When the letters are
 * indeterminates over ℚ or 𝔽_p the words are a basis over B_* (split exactness of residues along each letter in turn: F. Morel,
 * LNM 2052, Theorem 3.24, number from memory). Sorting uses [q][p] = ε[p][q], repetition [p][p] = [−1][p].
 *
 * This ring expands: an entry with k letters has up to 2ᵏ words. Past 5 000 words it refuses.
 */
export function wordRing(char: CharacteristicClass, budget: Budget): GradedRing<Monomial, Words> {
  const epsilon: SignClass = { x: -1n, y: -1n };
  let pace = 0;
  const one: Words = new Map([[0n, { x: 1n, y: 0n }]]);

  const put = (words: Map<bigint, SignClass>, degree: number, mask: bigint, b: SignClass): void => {
    const present = words.get(mask);
    const sum = present === undefined ? b : { x: present.x + b.x, y: present.y + b.y };
    boundedCoefficient(sum.x);
    boundedCoefficient(sum.y);
    const reduced = reduceSign(char, degree - countBits(mask), sum);
    if (reduced === undefined) words.delete(mask);
    else words.set(mask, reduced);
    if (words.size > WORD_LIMIT) throw wordsRefusal();
  };
  const nonZero = (words: Words): Words | undefined => (words.size === 0 ? undefined : words);

  const add = (degree: number, x: Words, y: Words): Words | undefined => {
    const sum = new Map(x);
    for (const [mask, b] of y) put(sum, degree, mask, b);
    return nonZero(sum);
  };
  const multiply = (m: number, x: Words, n: number, y: Words): Words | undefined => {
    const product = new Map<bigint, SignClass>();
    for (const [s, a] of x) {
      for (const [t, b] of y) {
        pace += 1;
        if (pace % 64 === 0) budget.spend('writing out canonical words');
        const common = s & t;
        const repeated = countBits(common);
        const [ma, nb] = [m - countBits(s), n - countBits(t)];
        let value = multiplySign(ma, a, nb, b);
        if (repeated > 0) value = multiplySign(ma + nb, value, repeated, { x: 1n, y: 0n });
        if (inversions(s, t) % 2 === 1) value = multiplySign(0, epsilon, ma + nb + repeated, value);
        put(product, m + n, s | t, value);
      }
    }
    return nonZero(product);
  };

  /** [±∏pᵉ] by [ab] = [a] + [b] + η[a][b] and [pᵉ] = e_ε[p]. */
  const symbol = ({ negative, exponents }: Monomial): Words | undefined => {
    let word: Words | undefined = negative ? nonZero(reduced(1, new Map([[0n, { x: 1n, y: 0n }]]))) : undefined;
    for (const [letter, e] of exponents) {
      const next = nonZero(reduced(1, new Map([[1n << BigInt(letter), epsilonMultiple(e)]])));
      if (word === undefined || next === undefined) {
        word = word ?? next;
        continue;
      }
      const both = multiply(1, word, 1, next);
      const correction = both && multiply(-1, one, 2, both);
      const sum = add(1, word, next);
      word = sum === undefined || correction === undefined ? (sum ?? correction) : add(1, sum, correction);
    }
    return word;
  };
  const reduced = (degree: number, words: Words): Words => {
    const result = new Map<bigint, SignClass>();
    for (const [mask, b] of words) put(result, degree, mask, b);
    return result;
  };

  return {
    integer: (n) => nonZero(reduced(0, new Map([[0n, { x: BigInt(n), y: 0n }]]))),
    symbol,
    angle: (a) => {
      const word = symbol(a);
      const eta = word && multiply(-1, one, 1, word);
      return eta === undefined ? one : add(0, one, eta);
    },
    eta: (power) => nonZero(reduced(-power, one)),
    add,
    negate: (degree, x) => nonZero(reduced(degree, new Map([...x].map(([mask, b]) => [mask, { x: -b.x, y: -b.y }])))),
    multiply,
    equal: (_degree, x, y) =>
      x.size === y.size && [...x].every(([mask, b]) => y.get(mask)?.x === b.x && y.get(mask)?.y === b.y),
  };
}

/** The letters of a mask, ascending. */
export function lettersOf(mask: bigint): readonly number[] {
  const letters: number[] = [];
  for (let rest = mask, i = 0; rest !== 0n; rest >>= 1n, i += 1) if ((rest & 1n) === 1n) letters.push(i);
  return letters;
}

/** The number of letters of a mask. */
export const countBits = (mask: bigint): number => (mask === 0n ? 0 : lettersOf(mask).length);

/** How many pairs (i in s, j in t) have i > j: the transpositions that sort [p_s][p_t]. */
export function inversions(s: bigint, t: bigint): number {
  let count = 0;
  for (const j of lettersOf(t)) count += countBits(s >> BigInt(j + 1));
  return count;
}
