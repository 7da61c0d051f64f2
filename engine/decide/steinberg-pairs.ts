import type { Budget } from '../arith/budget';
import { seeded } from '../arith/seeded';
import {
  addMulti,
  constantPolynomial,
  keyOf,
  multiplyMulti,
  negateMulti,
  powerMulti,
  scaleMulti,
  type LetterRing,
  type MultiPolynomial,
} from '../field/multivariate';
import type { Monomial } from '../ring/word-ring';
import type { Generator } from './letters-generators';

/** x + y = 1 for two ± monomials in generators, so that [x][y] = 0. `weight` counts the generators in it, with repetitions. */
export interface SteinbergPair {
  readonly x: Monomial;
  readonly y: Monomial;
  readonly weight: number;
}

/** Products of at most this many generators are looked at, and at most that many of them. */
const WEIGHT_LIMIT = 4;
const MONOMIAL_LIMIT = 420;
/** Where values at a point say little, over a small field, polynomials are added instead; that takes longer. */
const MONOMIAL_LIMIT_EXACT = 130;

/** A product of generators by their exponents, with its weight. */
interface Product {
  readonly exponents: readonly number[];
  readonly weight: number;
}

/**
 * The pairs x + y = 1 among ± monomials in pairwise coprime generators: all m₁ ± m₂ = ±m₃ for coprime products m₁, m₂ of
 * few generators, one pair for each, lightest first. Found by values at a point, and tested as polynomials.
 */
export function steinbergPairs(
  ring: LetterRing,
  generators: readonly Generator[],
  budget: Budget,
): readonly SteinbergPair[] {
  const p = ring.characteristic;
  return p === 0n || (p > 1_000_000n && p < 1n << 26n)
    ? find(ring, generators, pointValues(ring, generators), MONOMIAL_LIMIT, budget)
    : find(ring, generators, polynomialValues(ring, generators), MONOMIAL_LIMIT_EXACT, budget);
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

function find<V>(
  ring: LetterRing,
  generators: readonly Generator[],
  values: Values<V>,
  limit: number,
  budget: Budget,
): readonly SteinbergPair[] {
  const products = lightProducts(generators.length, limit);
  const valueOf = ({ exponents }: Product): V =>
    exponents.reduce((value, e, i) => {
      let result = value;
      for (let k = 0; k < e; k += 1) result = values.multiply(result, values.generators[i] ?? values.one);
      return result;
    }, values.one);
  const list = products.map((product) => ({ product, value: valueOf(product) }));
  const byKey = new Map(list.map((entry) => [values.key(entry.value), entry.product] as const));
  const pairs = new Map<string, SteinbergPair>();
  for (const [i, first] of list.entries()) {
    budget.spend('looking for Steinberg relations');
    for (let j = i + 1; j < list.length; j += 1) {
      const second = list[j];
      if (second === undefined || !coprime(first.product, second.product)) continue;
      for (const sign of [1, -1] as const) {
        const sum = values.add(first.value, sign === 1 ? second.value : values.negate(second.value));
        for (const turned of [1, -1] as const) {
          const third = byKey.get(values.key(turned === 1 ? sum : values.negate(sum)));
          if (third === undefined) continue;
          const name = [first.product, second.product, third].map(({ exponents }) => exponents.join()).sort();
          if (pairs.has(name.join(';'))) continue;
          if (!isSum(ring, generators, first.product, sign, second.product, turned, third)) continue;
          pairs.set(name.join(';'), pairOf(first.product, sign, second.product, turned, third));
        }
      }
    }
  }
  return [...pairs.values()].sort((a, b) => a.weight - b.weight);
}

/** Products of generators by rising weight, 1 among them, as many as there may be. */
function lightProducts(count: number, limit: number): readonly Product[] {
  const all: Product[] = [];
  let layer: readonly Product[] = [{ exponents: new Array<number>(count).fill(0), weight: 0 }];
  for (let weight = 0; weight <= WEIGHT_LIMIT && all.length + layer.length <= limit; weight += 1) {
    all.push(...layer);
    layer = layer.flatMap((product) => {
      const last = product.exponents.findLastIndex((e) => e > 0);
      return product.exponents.flatMap((_, i) =>
        i < last
          ? []
          : [{ exponents: product.exponents.map((e, k) => (k === i ? e + 1 : e)), weight: product.weight + 1 }],
      );
    });
  }
  return all;
}

const coprime = (a: Product, b: Product): boolean => a.exponents.every((e, i) => e === 0 || b.exponents[i] === 0);

/** Whether a + sign·b = turned·c as polynomials. */
function isSum(
  ring: LetterRing,
  generators: readonly Generator[],
  a: Product,
  sign: 1 | -1,
  b: Product,
  turned: 1 | -1,
  c: Product,
): boolean {
  const polynomial = ({ exponents }: Product): MultiPolynomial =>
    exponents.reduce(
      (product, e, i) => {
        const g = generators[i];
        if (e === 0 || g === undefined) return product;
        const value = g.kind === 'integer' ? constantPolynomial(ring, g.value) : g.value;
        return multiplyMulti(ring, product, powerMulti(ring, value, e));
      },
      constantPolynomial(ring, 1n),
    );
  const left = addMulti(ring, polynomial(a), scaleMulti(ring, BigInt(sign), polynomial(b)));
  return keyOf(left) === keyOf(scaleMulti(ring, BigInt(turned), polynomial(c)));
}

/** From a + sign·b = turned·c the pair over 1, or else over the product with the last generator. */
function pairOf(a: Product, sign: 1 | -1, b: Product, turned: 1 | -1, c: Product): SteinbergPair {
  // as a signed sum s₁m₁ + s₂m₂ + s₃m₃ = 0
  const signed = [
    { product: a, sign: 1 },
    { product: b, sign },
    { product: c, sign: -turned },
  ];
  const last = ({ exponents }: Product): number => exponents.findLastIndex((e) => e > 0);
  const rank = ({ product }: (typeof signed)[number]): number => (product.weight === 0 ? Infinity : last(product));
  const [below, ...others] = [...signed].sort((x, y) => rank(y) - rank(x));
  if (below === undefined) throw new RangeError('no pair');
  const [x, y] = others.map((above): Monomial => quotient(above, below));
  if (x === undefined || y === undefined) throw new RangeError('no pair');
  return { x, y, weight: a.weight + b.weight + c.weight };
}

/** −above/below. */
function quotient(
  above: { readonly product: Product; readonly sign: number },
  below: { readonly product: Product; readonly sign: number },
): Monomial {
  const exponents = new Map<number, bigint>();
  above.product.exponents.forEach((e, i) => {
    const difference = e - (below.product.exponents[i] ?? 0);
    if (difference !== 0) exponents.set(i, BigInt(difference));
  });
  return { negative: above.sign === below.sign, exponents };
}
