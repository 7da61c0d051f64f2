import type { Budget } from '../arith/budget';
import { toInt } from '../arith/int';
import type { GradedRing } from './graded-ring';
import { epsilonMultiple } from './sign-ring';
import { countBits, inversions, WORD_LIMIT, wordsRefusal } from './word-ring';

/** An entry u·∏ letters^exponent with u a unit of the field of constants; letters are counted from 0. */
export interface ScaledMonomial<A> {
  readonly unit: A;
  readonly exponents: ReadonlyMap<number, bigint>;
}

/** A combination Σ c·[p_S] of words in letters, by S as a bit mask; c lies in K^MW of the constants and is not zero. */
export type ScaledWords<H> = ReadonlyMap<bigint, H>;

/**
 * Words in letters over a field of constants κ whose K^MW_*(κ) is given as a graded ring. For independent letters over κ the
 * [p_S] are a basis over K^MW_*(κ) of what entries of this kind generate: residues along each letter in turn are split exact
 * (F. Morel, LNM 2052, Theorem 3.24, number from memory). Sorting uses x[p] = εⁿ[p]x for x of degree n and [p][p] = [−1][p]; and
 * [pⁿ] = n_ε[p].
 */
export function lettersRing<A, H>(
  constants: GradedRing<A, H>,
  minusOne: A,
  budget: Budget,
): GradedRing<ScaledMonomial<A>, ScaledWords<H>> {
  const minus = constants.symbol(minusOne);
  const form = constants.angle(minusOne);
  const epsilon = form && constants.negate(0, form);
  const eta = constants.eta(1);
  const one = constants.integer(1);
  let pace = 0;

  const times = (m: number, x: H | undefined, n: number, y: H | undefined): H | undefined =>
    x === undefined || y === undefined ? undefined : constants.multiply(m, x, n, y);
  const nonZero = (words: ScaledWords<H>): ScaledWords<H> | undefined => (words.size === 0 ? undefined : words);
  const single = (mask: bigint, c: H | undefined): ScaledWords<H> | undefined =>
    c === undefined ? undefined : new Map([[mask, c]]);
  const put = (words: Map<bigint, H>, degree: number, mask: bigint, c: H | undefined): void => {
    if (c === undefined) return;
    const present = words.get(mask);
    const sum = present === undefined ? c : constants.add(degree - countBits(mask), present, c);
    if (sum === undefined) words.delete(mask);
    else words.set(mask, sum);
    if (words.size > WORD_LIMIT) throw wordsRefusal();
  };
  const add = (degree: number, x: ScaledWords<H>, y: ScaledWords<H>): ScaledWords<H> | undefined => {
    const sum = new Map(x);
    for (const [mask, c] of y) put(sum, degree, mask, c);
    return nonZero(sum);
  };
  const plus = (degree: number, x: ScaledWords<H> | undefined, y: ScaledWords<H> | undefined) =>
    x === undefined ? y : y === undefined ? x : add(degree, x, y);

  /** c[p_s] · d[p_t] = ε^… cd[p_s][p_t], sorted. */
  const multiply = (m: number, x: ScaledWords<H>, n: number, y: ScaledWords<H>): ScaledWords<H> | undefined => {
    const product = new Map<bigint, H>();
    for (const [s, c] of x)
      for (const [t, d] of y) {
        pace += 1;
        if (pace % 64 === 0) budget.spend('writing out words in letters');
        const [inS, inT] = [countBits(s), countBits(t)];
        let degree = m - inS + n - inT;
        let value = times(m - inS, c, n - inT, d);
        for (let repeated = countBits(s & t); repeated > 0; repeated -= 1) {
          value = times(degree, value, 1, minus);
          degree += 1;
        }
        const odd = (inS * (n - inT) + inversions(s, t)) % 2 !== 0;
        put(product, m + n, s | t, odd ? times(0, epsilon, degree, value) : value);
      }
    return nonZero(product);
  };
  /** n_ε, as an element of K^MW_0 of the constants. */
  const multiple = (n: bigint): H | undefined => {
    const { x, y } = epsilonMultiple(n);
    const plain = constants.integer(toInt(x));
    const twisted = times(0, constants.integer(toInt(y)), 0, times(-1, eta, 1, minus));
    return plain === undefined ? twisted : twisted === undefined ? plain : constants.add(0, plain, twisted);
  };
  const symbol = ({ unit, exponents }: ScaledMonomial<A>): ScaledWords<H> | undefined => {
    let word = single(0n, constants.symbol(unit));
    for (const [letter, e] of exponents) {
      const next = single(1n << BigInt(letter), multiple(e));
      const both = word && next && multiply(1, word, 1, next);
      const twist = single(0n, eta);
      word = plus(1, plus(1, word, next), both && twist && multiply(-1, twist, 2, both));
    }
    return word;
  };

  return {
    integer: (n) => single(0n, constants.integer(n)),
    symbol,
    angle: (a) => {
      const word = symbol(a);
      const twist = single(0n, eta);
      return plus(0, single(0n, one), word && twist && multiply(-1, twist, 1, word));
    },
    eta: (power) => single(0n, constants.eta(power)),
    add,
    negate: (degree, x) => {
      const negated = new Map<bigint, H>();
      for (const [mask, c] of x) put(negated, degree, mask, constants.negate(degree - countBits(mask), c));
      return nonZero(negated);
    },
    multiply,
    equal: (degree, x, y) =>
      x.size === y.size &&
      [...x].every(([mask, c]) => {
        const other = y.get(mask);
        return other !== undefined && constants.equal(degree - countBits(mask), c, other);
      }),
  };
}
