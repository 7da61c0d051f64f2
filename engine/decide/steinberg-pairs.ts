import type { Budget } from '../arith/budget';
import { unlessExhausted } from '../arith/limited-budget';
import { seeded } from '../arith/seeded';
import { Refusal } from '../expression/refusal';
import {
  addMulti,
  constantPolynomial,
  keyOf,
  lettersIn,
  multiplyMulti,
  negateMulti,
  type LetterRing,
  type MultiPolynomial,
} from '../field/multivariate';
import type { Monomial } from '../ring/word-ring';
import type { Generator } from './letters-generators';
import {
  isCoprime,
  nameOfTriple,
  pairOf,
  polynomialOf,
  productOf,
  weightOf,
  type Product,
  type SteinbergPair,
  type Triple,
} from './steinberg-triples';

/** Products of at most this many generators are looked at, and at most that many of them. */
const WEIGHT_LIMIT = 4;
const MONOMIAL_LIMIT = 420;
/** Where values at a point say little, over a small field, polynomials are added instead; that takes longer. */
const MONOMIAL_LIMIT_EXACT = 130;
/** So many entries, of so many generators at most, are looked at with their quotients. */
const ENTRY_LIMIT = 24;
const ENTRY_WEIGHT = 16;

/**
 * The pairs x + y = 1 among ± monomials in pairwise coprime generators, lightest first, one for each sum m₁ ± m₂ = ±m₃ of coprime
 * products: those of few generators, found by values at a point and tested as polynomials, and those in which an entry of the
 * statement, or a quotient of two, is x. With a limited budget it gives those that were found; `complete` says whether it was enough.
 */
export function steinbergPairs(
  ring: LetterRing,
  generators: readonly Generator[],
  entries: readonly Monomial[],
  budget: Budget,
): { readonly pairs: readonly SteinbergPair[]; readonly complete: boolean } {
  const p = ring.characteristic;
  const triples = new Map<string, Triple>();
  const limited = { ...ring, budget };
  const joined = joinedGenerators(ring, generators);
  const complete = unlessExhausted(
    () => {
      entryTriples(limited, generators, joined, entries, triples, budget);
      if (p === 0n || (p > 1_000_000n && p < 1n << 26n))
        lightTriples(limited, generators, joined, pointValues(ring, generators), MONOMIAL_LIMIT, triples, budget);
      else
        lightTriples(
          limited,
          generators,
          joined,
          polynomialValues(limited, generators),
          MONOMIAL_LIMIT_EXACT,
          triples,
          budget,
        );
      return true;
    },
    () => false,
  );
  return { pairs: [...triples.values()].map(pairOf).sort((a, b) => a.weight - b.weight), complete };
}

/** A ring in which generators have values, those of different polynomials different as a rule. */
interface Values<V> {
  readonly one: V;
  readonly generators: readonly V[];
  multiply(a: V, b: V): V;
  add(a: V, b: V): V;
  negate(a: V): V;
  key(a: V): string | number;
}

const POINT_PRIME = 67108859;

function pointValues(ring: LetterRing, generators: readonly Generator[]): Values<number> {
  const q = ring.characteristic === 0n ? POINT_PRIME : Number(ring.characteristic);
  const stream = seeded(generators.length);
  const at = ring.letters.map(() => BigInt(Math.abs((stream() * 4294967296) % (q - 2)) + 2));
  const modulus = BigInt(q);
  const reduce = (n: bigint): number => Number(((n % modulus) + modulus) % modulus);
  const valueOf = (f: MultiPolynomial): number =>
    f.reduce((sum, { exponents, coefficient }) => {
      let value = coefficient % modulus;
      exponents.forEach((e, i) => {
        for (let k = 0; k < e; k += 1) value = (value * (at[i] ?? 1n)) % modulus;
      });
      return reduce(BigInt(sum) + value);
    }, 0);
  return {
    one: 1,
    generators: generators.map((g) => (g.kind === 'integer' ? reduce(g.value) : valueOf(g.value))),
    multiply: (a, b) => (a * b) % q,
    add: (a, b) => (a + b) % q,
    negate: (a) => (a === 0 ? 0 : q - a),
    key: (a) => a,
  };
}

function polynomialValues(ring: LetterRing, generators: readonly Generator[]): Values<MultiPolynomial> {
  return {
    one: constantPolynomial(ring, 1n),
    generators: generators.map((g) => (g.kind === 'integer' ? constantPolynomial(ring, g.value) : g.value)),
    multiply: (a, b) => multiplyMulti(ring, a, b),
    add: (a, b) => addMulti(ring, a, b),
    negate: (a) => negateMulti(ring, a),
    key: keyOf,
  };
}

/**
 * The generators that can occur in a sum m₁ ± m₂ = ±m₃ of coprime products. One that has a letter for itself cannot: only one of the
 * products would have the letter.
 */
function joinedGenerators(ring: LetterRing, generators: readonly Generator[]): readonly number[] {
  let left = generators.map((generator, index) => ({
    index,
    letters: generator.kind === 'integer' ? [] : lettersIn(ring, generator.value),
  }));
  for (;;) {
    const counts = ring.letters.map((_, letter) => left.filter(({ letters }) => letters.includes(letter)).length);
    const next = left.filter(({ letters }) => letters.every((letter) => (counts[letter] ?? 0) > 1));
    if (next.length === left.length) return left.map(({ index }) => index);
    left = next;
  }
}

/** Adds the sums of light products. */
function lightTriples<V>(
  ring: LetterRing,
  generators: readonly Generator[],
  joined: readonly number[],
  values: Values<V>,
  limit: number,
  triples: Map<string, Triple>,
  budget: Budget,
): void {
  const valueOf = (product: Product): V =>
    product.reduce((value, e, i) => {
      let result = value;
      for (let k = 0; k < e; k += 1) result = values.multiply(result, values.generators[i] ?? values.one);
      return result;
    }, values.one);
  const list = lightProducts(generators.length, joined, limit).map((product) => ({
    product,
    value: valueOf(product),
    support: product.reduce((bits, e, i) => (e > 0 ? bits | (1 << (i & 31)) : bits), 0),
  }));
  const byKey = new Map(list.map((entry) => [values.key(entry.value), entry.product] as const));
  const isZero = (triple: Triple): boolean =>
    triple.reduce<MultiPolynomial>((sum, m) => addMulti(ring, sum, polynomialOf(ring, generators, m)), []).length === 0;
  for (const [i, first] of list.entries()) {
    budget.spend('looking for Steinberg relations');
    for (let j = i + 1; j < list.length; j += 1) {
      const second = list[j];
      // bits say at once that most are not coprime; those of more than 32 generators only that they may not be
      if (second === undefined || ((first.support & second.support) !== 0 && generators.length <= 32)) continue;
      if (generators.length > 32 && !isCoprime(first.product, second.product)) continue;
      for (const minus of [false, true]) {
        const sum = values.add(first.value, minus ? values.negate(second.value) : second.value);
        for (const turned of [false, true]) {
          const third = byKey.get(values.key(turned ? values.negate(sum) : sum));
          if (third === undefined) continue;
          const name = nameOfTriple([first.product, second.product, third]);
          const triple: Triple = [
            { negative: false, product: first.product },
            { negative: minus, product: second.product },
            { negative: !turned, product: third },
          ];
          if (!triples.has(name) && isZero(triple)) triples.set(name, triple);
        }
      }
    }
  }
}

/** Products of the joined generators by rising weight, 1 among them, as many as there may be. */
function lightProducts(count: number, joined: readonly number[], limit: number): readonly Product[] {
  const all: Product[] = [];
  let layer: readonly Product[] = [new Array<number>(count).fill(0)];
  for (let weight = 0; weight <= WEIGHT_LIMIT && all.length + layer.length <= limit; weight += 1) {
    all.push(...layer);
    layer = layer.flatMap((product) => {
      const last = product.findLastIndex((e) => e > 0);
      return joined.flatMap((i) => (i < last ? [] : [product.map((e, k) => (k === i ? e + 1 : e))]));
    });
  }
  return all;
}

/** Adds the sums 1 − x for x an entry or a quotient of two, up to sign, as far as they are products again. */
function entryTriples(
  ring: LetterRing,
  generators: readonly Generator[],
  joined: readonly number[],
  entries: readonly Monomial[],
  triples: Map<string, Triple>,
  budget: Budget,
): void {
  const among = new Set(joined);
  const few = entries.slice(0, ENTRY_LIMIT);
  const candidates = [...few, ...few.flatMap((a, i) => few.slice(i + 1).map((b) => quotient(a, b)))];
  const seen = new Set<string>();
  for (const candidate of candidates) {
    if ([...candidate.exponents].some(([i, e]) => e !== 0n && !among.has(i))) continue;
    const [above, below] = [side(generators, candidate, 1n), side(generators, candidate, -1n)];
    if (above === undefined || below === undefined) continue;
    const name = nameOfTriple([above, below]);
    if (seen.has(name)) continue;
    seen.add(name);
    budget.spend('looking for Steinberg relations');
    for (const negative of [false, true]) {
      const [first, second] = [
        { negative: false, product: below },
        { negative, product: above },
      ];
      const third = withoutLimit(() => {
        const sum = addMulti(ring, polynomialOf(ring, generators, first), polynomialOf(ring, generators, second));
        return sum.length === 0 ? undefined : productOf(ring, generators, sum);
      });
      if (third === undefined) continue;
      const whole = nameOfTriple([below, above, third.product]);
      if (!triples.has(whole)) triples.set(whole, [first, second, { ...third, negative: !third.negative }]);
    }
  }
}

/** The numerator (1) or the denominator (−1) of a monomial; `undefined` where it is too heavy to multiply out. */
function side(generators: readonly Generator[], { exponents }: Monomial, sign: 1n | -1n): Product | undefined {
  const product = generators.map((_, i) => {
    const e = (exponents.get(i) ?? 0n) * sign;
    return e > 0n ? Number(e) : 0;
  });
  return weightOf(product) > ENTRY_WEIGHT ? undefined : product;
}

function quotient(a: Monomial, b: Monomial): Monomial {
  const exponents = new Map(a.exponents);
  for (const [i, e] of b.exponents) exponents.set(i, (exponents.get(i) ?? 0n) - e);
  return { negative: a.negative !== b.negative, exponents };
}

/** Sums that are too long to multiply out are left out. */
function withoutLimit<T>(work: () => T): T | undefined {
  try {
    return work();
  } catch (error) {
    if (error instanceof Refusal && error.code === 'size') return undefined;
    throw error;
  }
}
