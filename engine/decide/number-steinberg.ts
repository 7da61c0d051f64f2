import type { Budget } from '../arith/budget';
import { IntegerLattice, type SparseVector } from '../arith/integer-lattice';
import { limitedBudget, unlessExhausted } from '../arith/limited-budget';
import { inverseModulo } from '../arith/modular';
import { residuesModulo } from '../field/modular-gcd';
import type { NumberField, NumberFieldElement } from '../field/number-field';
import { SmallPrimePolynomials } from '../field/small-prime-polynomials';
import { wordPrime } from '../field/word-primes';
import { lettersOf, type Monomial, type Words } from '../ring/word-ring';
import { searchProof } from './steinberg-proof';
import type { SteinbergPair } from './steinberg-triples';

/** Steps that a search may take, and products of generators that it looks at. */
const STEPS = 20_000;
const PRODUCTS = 3_000;
/** Of so many generators all are used; of more, those that the class has. */
const FEW = 8;

/**
 * Whether a class of K^M_n of a number field, in canonical words of generators, is seen to be 0 by Steinberg relations x + y = 1 among small
 * products of these generators, and by such products that are 1. `false` says only that none was found.
 */
export function vanishesBySteinberg(
  words: Words,
  degree: number,
  field: NumberField,
  generators: readonly NumberFieldElement[],
  budget: Budget,
): boolean {
  const limited = limitedBudget(budget, STEPS);
  return unlessExhausted(
    () => {
      const letters =
        generators.length > FEW
          ? [...new Set([...words.keys()].flatMap(lettersOf))]
          : generators.slice(1).map((_, letter) => letter);
      const { pairs, ones } = relationsAmong(field, generators, letters, limited);
      const hulls = [...words.keys()];
      return searchProof('zero', degree, words, pairs, hulls, limited, 'eta', ones).proof !== undefined;
    },
    () => false,
  );
}

/** A product of powers of generators by their letters; letter i is generator i + 1. */
type Exponents = ReadonlyMap<number, bigint>;

/**
 * Products of few generators, and their negatives, that are 1 (independent ones), and pairs of them that add up to 1: found modulo a
 * prime, then tested.
 */
function relationsAmong(
  field: NumberField,
  generators: readonly NumberFieldElement[],
  letters: readonly number[],
  budget: Budget,
): { readonly pairs: readonly SteinbergPair[]; readonly ones: readonly Monomial[] } {
  const spend = (): void => budget.spend(`looking for Steinberg relations in ${field.name}`);
  const exact = (exponents: Exponents): NumberFieldElement =>
    [...exponents].reduce((product, [i, e]) => {
      const g = e < 0n ? field.inverse(generators[i + 1]!) : generators[i + 1]!;
      const power = e === 2n || e === -2n ? field.multiply(g, g) : g;
      return field.multiply(product, power);
    }, field.one);

  const powers = letters.flatMap((i) => [1n, -1n, 2n, -2n].map((e) => ({ i, e, value: exact(new Map([[i, e]])) })));
  const ring = goodPrime(
    field,
    powers.map(({ value }) => value),
    spend,
  );
  const found = new Map<string, Exponents>();
  const products: { readonly exponents: Exponents; readonly residue: readonly number[] }[] = [];
  const ones: Monomial[] = [];
  const known = new IntegerLattice(spend);
  known.insert([[0, 2n]]);
  const put = (exponents: Exponents, residue: readonly number[]): void => {
    products.push({ exponents, residue });
    for (const negative of [false, true]) {
      const same = found.get((negative ? ring.subtract([], residue) : residue).join());
      if (same === undefined) continue;
      const one = { negative, exponents: quotient(exponents, same) };
      const vector = vectorOf(one);
      if (known.express(vector) !== undefined || !isSame(exponents, same, negative)) continue;
      known.insert(vector, ones.length);
      ones.push(one);
    }
    if (!found.has(residue.join())) found.set(residue.join(), exponents);
  };
  put(new Map(), ring.one);
  for (const { i, e, value } of powers) {
    const residue = ring.residue(value);
    for (const other of products.slice(0, PRODUCTS)) {
      if (other.exponents.has(i) || other.exponents.size > 2 || products.length > PRODUCTS) continue;
      spend();
      put(new Map([...other.exponents, [i, e]]), ring.multiply(other.residue, residue));
    }
  }
  const pairs: SteinbergPair[] = [];
  const seen = new Set<string>();
  for (const { exponents, residue } of products) {
    for (const negative of [false, true]) {
      spend();
      const rest = negative ? ring.add(ring.one, residue) : ring.subtract(ring.one, residue);
      for (const otherNegative of [false, true]) {
        const other = found.get((otherNegative ? ring.subtract([], rest) : rest).join());
        if (other === undefined || exponents.size + other.size === 0) continue;
        const pair = { x: { negative, exponents }, y: { negative: otherNegative, exponents: other } };
        const name = [pair.x, pair.y].map(nameOf).sort().join(' + ');
        if (seen.has(name) || !isOne(pair)) continue;
        seen.add(name);
        pairs.push({ ...pair, weight: exponents.size + other.size });
      }
    }
  }
  return { pairs, ones };

  function isSame(a: Exponents, b: Exponents, negative: boolean): boolean {
    const [x, y] = [exact(a), exact(b)];
    return field.equal(x, negative ? field.negate(y) : y);
  }

  function isOne({ x, y }: { readonly x: Monomial; readonly y: Monomial }): boolean {
    const [a, b] = [x, y].map(({ negative, exponents }) => {
      const value = exact(exponents);
      return negative ? field.negate(value) : value;
    });
    return field.equal(field.add(a!, b!), field.one);
  }
}

/** a/b, without exponents that are 0. */
function quotient(a: Exponents, b: Exponents): Exponents {
  const result = new Map(a);
  for (const [i, e] of b) result.set(i, (result.get(i) ?? 0n) - e);
  return new Map([...result].filter(([, e]) => e !== 0n));
}

/** The exponents as a vector: that of −1 first, then the letters. */
const vectorOf = ({ negative, exponents }: Monomial): SparseVector => [
  ...(negative ? ([[0, 1n]] as const) : []),
  ...[...exponents].map(([i, e]) => [i + 1, e] as const).sort(([i], [j]) => i - j),
];

const nameOf = ({ negative, exponents }: Monomial): string =>
  `${negative ? '-' : ''}${[...exponents]
    .sort(([i], [j]) => i - j)
    .map(([i, e]) => `${i}^${e}`)
    .join()}`;

/** Residues of elements of a number field modulo a prime that is in no denominator. */
function goodPrime(
  field: NumberField,
  elements: readonly NumberFieldElement[],
  spend: () => void,
): {
  readonly one: readonly number[];
  residue(a: NumberFieldElement): readonly number[];
  add(a: readonly number[], b: readonly number[]): readonly number[];
  subtract(a: readonly number[], b: readonly number[]): readonly number[];
  multiply(a: readonly number[], b: readonly number[]): readonly number[];
} {
  const models = elements.map((a) => field.model.integral(a));
  for (let place = 0; ; place++) {
    const p = wordPrime(place);
    if (models.some(({ denominator }) => denominator % BigInt(p) === 0n)) continue;
    const ring = new SmallPrimePolynomials(p, spend);
    const multiply = ring.multiplyModulo(residuesModulo(field.model.modulus, p));
    const inverted = (n: bigint): readonly number[] => residuesModulo([inverseModulo(n, BigInt(p))], p);
    return {
      one: ring.one,
      residue: (a) => {
        const { numerator, denominator } = field.model.integral(a);
        return multiply(residuesModulo(numerator, p), inverted(denominator));
      },
      add: (a, b) => ring.add(a, b),
      subtract: (a, b) => ring.subtract(a, b),
      multiply,
    };
  }
}
