import type { Budget } from '../arith/budget';
import { negateInt } from '../arith/int';
import type { Expression } from '../expression/expression';
import { rationals } from '../field/rational';
import {
  constantFunction,
  multiplyFunctions,
  polynomialFunction,
  powerFunction,
  substituteLetter,
  type LetterFunction,
} from '../field/letter-function';
import {
  coefficientsIn,
  degreeIn,
  isConstant,
  leadingIn,
  lettersIn,
  negateMulti,
  type LetterRing,
  type MultiPolynomial,
} from '../field/multivariate';
import { splitBase } from '../field/multivariate-split';
import { leastSize } from '../field/write-multivariate';
import { evaluate } from '../ring/evaluate';
import { characteristicClass } from '../ring/sign-ring';
import { tabledRing } from '../ring/tabled-ring';
import type { Term } from '../ring/term';
import { wordRing } from '../ring/word-ring';
import { exponentsOver } from './letters-generators';
import { leafDifferences, placesOf, type LeafDifference } from './letters-leaf';

/** One step on the way to a field with fewer letters: the residue at an irreducible polynomial, or s at infinity in a letter. */
export type Step =
  { readonly kind: 'residue'; readonly at: MultiPolynomial } | { readonly kind: 'infinity'; readonly letter: number };

/** A chain of residues and specialisations at whose end a class does not vanish. */
export interface Separation extends LeafDifference {
  readonly path: readonly Step[];
  /** What the two sides end in. */
  left(): Expression;
  right(): Expression;
}

/** What the places tell about a class, by degree. */
export interface Seen {
  /** The first chain found that ends in something not zero. */
  readonly separations: ReadonlyMap<number, Separation>;
  /** Degrees in which something was met that could not be told. */
  readonly open: ReadonlySet<number>;
  /** Degrees in which something that is not zero modulo η, or modulo h, was found. */
  readonly notModEta: ReadonlySet<number>;
  readonly notModH: ReadonlySet<number>;
  readonly chains: number;
}

/** An entry on its way: a function in the letters that are left, times powers of marks that stand for uniformizers. */
interface Entry {
  readonly value: LetterFunction;
  readonly marks: readonly bigint[];
}

interface Stage {
  readonly terms: readonly Term<number>[];
  readonly entries: ReadonlyMap<number, Entry>;
  readonly letters: ReadonlySet<number>;
  readonly path: readonly Step[];
  readonly markCount: number;
}

/**
 * Decides whether two sums of terms are equal over ℚ(letters) or 𝔽_p(letters), by J. Milnor's sequence for Milnor–Witt K-theory along one
 * letter after the other: over k(t) a class is zero iff its residues at all irreducible polynomials of k[t] and s at infinity
 * are (F. Morel, LNM 2052, Theorem 3.24; J. Milnor, Invent. Math. 9, 1970, Theorem 2.3; numbers from memory).
 *
 * Residue and specialisation at P come at once, as the ring map that replaces every entry by its leading term: Pⁿu becomes yⁿū
 * with a new letter y, a mark, and [y] takes the part of ξ in Θ_P (Morel, Theorem 3.15). So nothing is expanded before the
 * last letter is gone. The residue field at P is again a field of rational functions where P has degree 1 in some letter;
 * other residue fields are not entered: there a residue counts as zero when it vanishes as a word in the factors of its entries,
 * and as open when not.
 */
export function seeLetters(
  ring: LetterRing,
  entries: readonly LetterFunction[],
  [left, right]: readonly [readonly Term<number>[], readonly Term<number>[]],
  budget: Budget,
): Seen {
  // left − right, each term on the right known by its negative
  const onRight = new Map(right.map((term) => [{ ...term, coefficient: negateInt(term.coefficient) }, term] as const));
  const all = [...left, ...onRight.keys()];
  const separations = new Map<number, Separation>();
  const open = new Set<number>();
  const notModEta = new Set<number>();
  const notModH = new Set<number>();
  let chains = 0;

  const visit = (stage: Stage): void => {
    budget.spend('taking residues along letters');
    if (stage.terms.length === 0) return;
    const factored = factorStage(ring, stage);
    if (factored.base.length === 0) return leaf(stage);
    const letter = chooseLetter(ring, stage, factored.base);
    const infinite = factored.base.map((f) => (degreeIn(f, letter) > 0 ? leadingIn(f, letter) : f));
    visit({
      ...stage,
      entries: replaced(
        ring,
        stage,
        factored,
        infinite.map((f) => polynomialFunction(ring, f)),
        undefined,
      ),
      letters: without(stage.letters, letter),
      path: [...stage.path, { kind: 'infinity', letter }],
    });
    factored.base.forEach((at, index) => {
      if (degreeIn(at, letter) > 0) residue(stage, factored, at, index);
    });
  };

  const residue = (stage: Stage, factored: Factored, at: MultiPolynomial, index: number): void => {
    const ramified = stage.terms.filter((term) =>
      [...placesOf([term])].some((place) => factored.exponents.get(place)?.has(index)),
    );
    if (ramified.length === 0) return;
    const solvable = linearLetter(ring, at, stage.letters);
    if (solvable === undefined) return formal({ ...stage, terms: ramified }, factored, index);
    const value = solved(ring, at, solvable);
    const images = factored.base.map((f, i) =>
      i === index ? constantFunction(ring, rationals.one) : substituteLetter(ring, f, solvable, value),
    );
    visit({
      terms: ramified,
      entries: replaced(ring, { ...stage, terms: ramified }, factored, images, index),
      letters: without(stage.letters, solvable),
      path: [...stage.path, { kind: 'residue', at }],
      markCount: stage.markCount + 1,
    });
  };

  const leaf = (stage: Stage): void => {
    chains += 1;
    const entryAt = (place: number) => {
      const entry = stage.entries.get(place);
      if (entry === undefined) throw new RangeError('an entry that was not carried along');
      return { constant: entry.value.constant, marks: entry.marks };
    };
    const { terms, markCount } = stage;
    for (const found of leafDifferences({ characteristic: ring.characteristic, terms, entryAt, markCount }, budget)) {
      if (!separations.has(found.degree)) {
        const side = (own: ReadonlySet<Term<number>>) => (): Expression =>
          found.value(terms.filter((term) => own.has(term)));
        const right = (): Expression => found.value(terms.flatMap((term) => onRight.get(term) ?? []));
        separations.set(found.degree, { ...found, path: stage.path, left: side(new Set(left)), right });
      }
      if (!found.zeroModEta) notModEta.add(found.degree);
      if (!found.zeroModH) notModH.add(found.degree);
    }
  };

  /** At a place whose residue field is not entered: the words that hold its mark and all others must cancel by themselves. */
  const formal = (stage: Stage, factored: Factored, index: number): void => {
    const { markCount } = stage;
    const constants = new Map<string, number>();
    const monomial = (place: number) => {
      const entry = stage.entries.get(place);
      const exponents = new Map<number, bigint>();
      entry?.marks.forEach((e, i) => {
        if (e !== 0n) exponents.set(i, e);
      });
      for (const [i, e] of factored.exponents.get(place) ?? []) exponents.set(markCount + i, e);
      const { constant } = entry?.value ?? never();
      const [num, den] = [leastSize(ring, constant.num), constant.den];
      const negative = num < 0n;
      const size = `${negative ? -num : num}/${den}`;
      if (size !== '1/1') {
        if (!constants.has(size)) constants.set(size, markCount + factored.base.length + constants.size);
        exponents.set(constants.get(size) ?? 0, 1n);
      }
      return { negative, exponents };
    };
    const words = wordRing(characteristicClass(ring.characteristic), budget);
    const needed = ((1n << BigInt(markCount)) - 1n) | (1n << BigInt(markCount + index));
    for (const [degree, value] of evaluate(stage.terms, tabledRing(words, monomial), budget))
      if ([...value.keys()].some((mask) => (mask & needed) === needed)) open.add(degree);
  };

  visit({
    terms: all,
    entries: new Map([...placesOf(all)].map((place) => [place, { value: entries[place] ?? never(), marks: [] }])),
    letters: new Set(ring.letters.map((_, i) => i)),
    path: [],
    markCount: 0,
  });
  return { separations, open, notModEta, notModH, chains };
}

/** The entries of a stage over a coprime base of their factors. */
interface Factored {
  readonly base: readonly MultiPolynomial[];
  /** Exponents by entry and by place in the base, those that are 0 left out. */
  readonly exponents: ReadonlyMap<number, ReadonlyMap<number, bigint>>;
}

function factorStage(ring: LetterRing, { terms, entries }: Stage): Factored {
  const places = [...placesOf(terms)];
  const polynomials = new Map<string, MultiPolynomial>();
  for (const place of places)
    for (const [key, { base }] of entries.get(place)?.value.factors ?? []) polynomials.set(key, base);
  const base = splitBase(ring, polynomials.values());
  const inBase = new Map([...polynomials].map(([key, f]) => [key, exponentsOver(ring, f, base)] as const));
  const used = new Set<number>();
  const exponents = new Map<number, Map<number, bigint>>();
  for (const place of places) {
    const own = new Map<number, bigint>();
    for (const [key, { exponent }] of entries.get(place)?.value.factors ?? [])
      for (const [i, e] of inBase.get(key) ?? []) own.set(i, (own.get(i) ?? 0n) + exponent * BigInt(e));
    for (const [i, e] of own)
      if (e === 0n) own.delete(i);
      else used.add(i);
    exponents.set(place, own);
  }
  if (used.size === base.length) return { base, exponents };
  const kept = base.map((_, i) => i).filter((i) => used.has(i));
  const moved = new Map(kept.map((old, i) => [old, i]));
  return {
    base: kept.flatMap((i) => [base[i] ?? never()]),
    exponents: new Map(
      [...exponents].map(([place, own]) => [place, new Map([...own].map(([i, e]) => [moved.get(i) ?? 0, e]))]),
    ),
  };
}

/** The entries of the terms with every base element replaced by its image, and one of them by a new mark. */
function replaced(
  ring: LetterRing,
  { terms, entries }: Stage,
  { exponents }: Factored,
  images: readonly LetterFunction[],
  mark: number | undefined,
): ReadonlyMap<number, Entry> {
  const result = new Map<number, Entry>();
  for (const place of placesOf(terms)) {
    const entry = entries.get(place) ?? never();
    let value = constantFunction(ring, entry.value.constant);
    for (const [i, e] of exponents.get(place) ?? [])
      if (i !== mark) value = multiplyFunctions(ring, value, powerFunction(ring, images[i] ?? never(), e));
    const marks = mark === undefined ? entry.marks : [...entry.marks, exponents.get(place)?.get(mark) ?? 0n];
    result.set(place, { value, marks });
  }
  return result;
}

/** The letter along which the fewest residues are met that cannot be entered, and then the fewest at all. */
function chooseLetter(ring: LetterRing, { letters }: Stage, base: readonly MultiPolynomial[]): number {
  const present = new Set(base.flatMap((f) => lettersIn(ring, f)));
  let best: { readonly letter: number; readonly cost: number } | undefined;
  for (const letter of present) {
    let cost = 0;
    for (const f of base)
      if (degreeIn(f, letter) > 0) cost += linearLetter(ring, f, letters) === undefined ? 1000 : 1 + f.length;
    if (best === undefined || cost < best.cost) best = { letter, cost };
  }
  return best?.letter ?? never();
}

/** A letter in which a polynomial has degree 1, with as short a coefficient as there is. */
function linearLetter(ring: LetterRing, f: MultiPolynomial, letters: ReadonlySet<number>): number | undefined {
  let best: { readonly letter: number; readonly cost: number } | undefined;
  for (const letter of lettersIn(ring, f)) {
    if (!letters.has(letter) || degreeIn(f, letter) !== 1) continue;
    const lead = leadingIn(f, letter);
    const cost = isConstant(lead) ? 0 : lead.length;
    if (best === undefined || cost < best.cost) best = { letter, cost };
  }
  return best?.letter;
}

/** The value of a letter where a polynomial of degree 1 in it is 0. */
function solved(ring: LetterRing, f: MultiPolynomial, letter: number): LetterFunction {
  const parts = coefficientsIn(f, letter);
  const rest = polynomialFunction(ring, negateMulti(ring, parts.get(0) ?? []));
  return multiplyFunctions(ring, rest, powerFunction(ring, polynomialFunction(ring, parts.get(1) ?? []), -1n));
}

const without = (letters: ReadonlySet<number>, letter: number): ReadonlySet<number> =>
  new Set([...letters].filter((other) => other !== letter));

function never(): never {
  throw new RangeError('out of range');
}
