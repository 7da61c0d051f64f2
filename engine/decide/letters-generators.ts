import { coprimeBase } from '../arith/coprime-base';
import { valuation } from '../arith/valuation';
import { integerElement, letterElement, type Element } from '../expression/element';
import { elementText } from '../expression/to-text';
import type { LetterFunction } from '../field/letter-function';
import { isConstant, scaleMulti, type LetterRing, type MultiPolynomial } from '../field/multivariate';
import { multiplicity } from '../field/multivariate-division';
import { splitBase } from '../field/multivariate-split';
import { leastSize, writeMultivariate, writtenSign } from '../field/write-multivariate';
import type { Monomial } from '../ring/word-ring';

/** A member of a coprime base of entries: an integer > 1, a letter, or another polynomial, as it is written. */
export type Generator = { readonly element: Element } & (
  | { readonly kind: 'integer'; readonly value: bigint }
  | { readonly kind: 'letter'; readonly letter: number; readonly value: MultiPolynomial }
  | { readonly kind: 'polynomial'; readonly value: MultiPolynomial }
);

/** Entries as ± products of generators, which are pairwise coprime: integers first, then letters, then sums. */
export interface Generated {
  readonly generators: readonly Generator[];
  /** The entries in their order, as monomials in the generators. */
  readonly monomials: readonly Monomial[];
}

/** Takes entries, none of them zero, apart into ± products of pairwise coprime generators; those that cancel are left out. */
export function generated(ring: LetterRing, entries: readonly LetterFunction[]): Generated {
  const polynomials = new Map<string, MultiPolynomial>();
  for (const { factors } of entries) for (const [key, { base }] of factors) polynomials.set(key, base);
  const base = splitBase(ring, polynomials.values());
  const inBase = new Map([...polynomials].map(([key, f]) => [key, exponentsOver(ring, f, base)] as const));
  const integers = coprimeBase(
    entries.flatMap(({ constant }) => [leastSize(ring, constant.num), constant.den]).filter((n) => n !== 0n),
  );

  const written = base.map((f, index) => ({ generator: generatorOf(ring, f), index, sign: writtenSign(ring, f) }));
  written.sort((a, b) => compareGenerators(a.generator, b.generator));
  const places = new Map(written.map(({ index, sign }, i) => [index, { place: integers.length + i, sign }]));

  const monomials = entries.map(({ constant, factors }): Monomial => {
    const exponents = new Map<number, bigint>();
    const num = leastSize(ring, constant.num);
    let negative = num < 0n;
    integers.forEach((n, i) => {
      const e = valuation(num, n).exponent - valuation(constant.den, n).exponent;
      if (e !== 0) exponents.set(i, BigInt(e));
    });
    for (const [key, { exponent }] of factors)
      for (const [index, e] of inBase.get(key) ?? []) {
        const { place, sign } = places.get(index) ?? { place: -1, sign: 1 };
        const power = exponent * BigInt(e);
        exponents.set(place, (exponents.get(place) ?? 0n) + power);
        if (sign < 0 && power % 2n !== 0n) negative = !negative;
      }
    return { negative, exponents };
  });
  const generators = [
    ...integers.map((value): Generator => ({ kind: 'integer', value, element: integerElement(value) })),
    ...written.map(({ generator }) => generator),
  ];
  return withoutUnused(generators, monomials);
}

/** Leaves out generators that no entry has, and exponents that are 0; exponents stand in the order of the generators. */
function withoutUnused(generators: readonly Generator[], monomials: readonly Monomial[]): Generated {
  const used = new Set(monomials.flatMap(({ exponents }) => [...exponents].flatMap(([i, e]) => (e === 0n ? [] : [i]))));
  const kept = generators.map((_, i) => i).filter((i) => used.has(i));
  const newPlace = new Map(kept.map((old, i) => [old, i]));
  return {
    generators: kept.flatMap((i) => generators[i] ?? []),
    monomials: monomials.map(({ negative, exponents }) => ({
      negative,
      exponents: new Map(
        [...exponents]
          .flatMap(([i, e]) => (e === 0n ? [] : [[newPlace.get(i) ?? -1, e] as const]))
          .sort(([a], [b]) => a - b),
      ),
    })),
  };
}

/** The base elements in a polynomial with their exponents, by index. */
export function exponentsOver(
  ring: LetterRing,
  f: MultiPolynomial,
  base: readonly MultiPolynomial[],
): readonly (readonly [index: number, exponent: number])[] {
  const found: (readonly [number, number])[] = [];
  let left = f;
  for (const [index, b] of base.entries()) {
    if (isConstant(left)) break;
    const { exponent, rest } = multiplicity(ring, left, b);
    if (exponent > 0) found.push([index, exponent]);
    left = rest;
  }
  if (!isConstant(left)) throw new Error('a factor is not in the base');
  return found;
}

function generatorOf(ring: LetterRing, f: MultiPolynomial): Generator {
  const [term, more] = f;
  const letter = more === undefined ? (term?.exponents.findIndex((e) => e !== 0) ?? -1) : -1;
  if (letter >= 0) return { kind: 'letter', letter, value: f, element: letterElement(ring.letters[letter] ?? 'a') };
  const value = scaleMulti(ring, BigInt(writtenSign(ring, f)), f);
  return { kind: 'polynomial', value, element: writeMultivariate(ring, value) };
}

/** Letters in their order, then sums by degree, by length and as texts. */
function compareGenerators(a: Generator, b: Generator): number {
  if (a.kind === 'letter' && b.kind === 'letter') return a.letter - b.letter;
  if (a.kind === 'letter' || b.kind === 'letter') return a.kind === 'letter' ? -1 : 1;
  if (a.kind === 'integer' || b.kind === 'integer') return 0;
  const degree = (f: MultiPolynomial): number =>
    Math.max(...f.map(({ exponents }) => exponents.reduce((sum, e) => sum + e, 0)));
  const [x, y] = [elementText(a.element), elementText(b.element)];
  return degree(a.value) - degree(b.value) || a.value.length - b.value.length || (x < y ? -1 : x > y ? 1 : 0);
}
