import { wittInvariants, type WittSymbols } from '../ring/witt-symbol-ring';
import type { NumberArithmetic } from './number-arithmetic';
import type { NumberUnit } from './number-classes';
import type { NumberValue } from './number-value';

/** What is known of a class of K^MW_n of a number field; `undefined` stands for what is not. */
export interface ZeroTest {
  readonly zero: boolean | undefined;
  /** Whether it is zero in Milnor K-theory. */
  readonly modEta: boolean | undefined;
  /** Whether it is zero in the Witt ring. */
  readonly modH: boolean | undefined;
}

/**
 * Whether the part of degree n of a class over a number field L is zero. By the pull-back theorem (F. Morel, Comment. Math. Helv. 79, 2004)
 * it is, iff it is zero in K^M_n(L) and in W(L).
 *
 * W(L): iff the rank is even, the signed discriminant a square, all signatures are 0 and the Hasse invariant is that of hyperbolic planes at
 * every finite place (Hasse–Minkowski: T. Y. Lam, Introduction to Quadratic Forms over Fields, VI.3, number from memory). K^M_1 = L^×. For n ≥ 3
 * the signatures see both: K^M_n(L) is a sum of groups ℤ/2, one for each real place (H. Bass, J. Tate, The Milnor ring of a global field,
 * Theorem II.2.1, number from memory), and Iⁿ(L) has no torsion. For n = 2 tame symbols are looked at as well (that all is seen but for a finite group is J. Tate's theorem, Symbols in arithmetic, ICM
 * 1970, number from memory), and a proof by Steinberg relations is looked for; what is left is open.
 */
export function zeroTest<A, B extends NumberUnit>(
  value: NumberValue<A, B>,
  degree: number,
  arithmetic: NumberArithmetic,
): ZeroTest {
  if (value.words(degree) === undefined) return { zero: true, modEta: true, modH: true };
  const signatures = value.signatures(degree);
  const flat = signatures.every((s) => s === 0n);
  if (degree >= 3) {
    const modEta = signatures.every((s) => s % 2n ** BigInt(degree + 1) === 0n);
    return { zero: flat, modEta, modH: flat };
  }
  const witt = value.witt(degree);
  const graded = !flat ? false : isZeroModCube(witt, arithmetic);
  if (degree === 2) return symbolTest(graded, flat, value, arithmetic, signatures, witt);
  const modEta = degree < 0 || (degree === 0 ? value.rank() === 0n : arithmetic.isOne(value.unit()));
  return { zero: modEta && graded, modEta, modH: graded };
}

function symbolTest<A, B extends NumberUnit>(
  modH: boolean,
  flat: boolean,
  value: NumberValue<A, B>,
  arithmetic: NumberArithmetic,
  signatures: readonly bigint[],
  witt: WittSymbols | undefined,
): ZeroTest {
  const seenModTwo = !signatures.every((s) => s % 8n === 0n) || !(flat ? modH : isZeroModCube(witt, arithmetic));
  if (seenModTwo) return { zero: false, modEta: false, modH };
  const words = value.words(2);
  if (words === undefined) return { zero: true, modEta: true, modH: true };
  if (words === 'too long') return { zero: modH ? undefined : false, modEta: undefined, modH };
  if (!arithmetic.tameSymbolsVanish(words)) return { zero: false, modEta: false, modH };
  if (!modH) return { zero: false, modEta: undefined, modH };
  // Zero in W(L), it remains to see it in K^M_2.
  return arithmetic.vanishesBySteinberg(words, 2)
    ? { zero: true, modEta: true, modH: true }
    : { zero: undefined, modEta: undefined, modH };
}

/** Whether a Witt class is zero modulo I³ at all finite places. */
export function isZeroModCube(value: WittSymbols | undefined, arithmetic: NumberArithmetic): boolean {
  const { rank, determinant, symbols } = wittInvariants(value);
  return rank === 0 && arithmetic.isSquare(determinant) && arithmetic.splits(symbols);
}
