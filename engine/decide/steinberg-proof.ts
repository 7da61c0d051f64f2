import type { Budget } from '../arith/budget';
import { IntegerLattice, type SparseVector } from '../arith/integer-lattice';
import { multiplySign, type CharacteristicClass, type SignClass } from '../ring/sign-ring';
import { countBits, inversions, lettersOf, wordRing, type Monomial, type Words } from '../ring/word-ring';
import type { SteinbergPair } from './steinberg-triples';

/** A multiple of a Steinberg relation: coefficient · word · [x][y] · [p_S], with S the generators that no relation has. */
export interface UsedRelation {
  readonly coefficient: bigint;
  readonly word: Words;
  readonly pair: SteinbergPair;
  readonly beside: bigint;
}

/** What a search for a proof came to. */
export interface ProofSearch {
  /** The multiples of Steinberg relations that add up to the class; absent when none were found. */
  readonly proof?: readonly UsedRelation[];
  /** How many multiples were looked at. */
  readonly relations: number;
  /** Whether there were more of them than may be looked at. */
  readonly cut: boolean;
}

/** What is set to zero beside Steinberg relations: nothing, or the multiples of η, or those of h. */
export type Modulo = 'nothing' | 'eta' | 'h';

/** At most this many multiples of relations enter the linear system of one degree. */
const RELATION_LIMIT = 2_500;
/** … and so many sets of generators are looked at. */
const HULL_LIMIT = 48;

/**
 * Looks for a class of canonical words, in one degree, among the integer combinations of multiples of Steinberg relations
 * [x][y] = 0, x + y = 1. Words in −1, η and the generators commute up to ε, so that multiples on one side are all: they are
 * taken by every canonical word of the degree that is missing, smallest first, and the integer linear system is solved.
 * Generators that no relation has are coordinates by themselves: the words beside each product of them are looked at apart.
 *
 * `ones` are products of generators that are 1 in the field at hand, so that [one] = 0 is a relation as well; in `proof` only
 * Steinberg relations are listed.
 *
 * `hulls` are sets of generators, as bit masks, in whose unions the proof is looked for first: those of the terms.
 */
export function searchProof(
  char: CharacteristicClass,
  degree: number,
  target: Words,
  pairs: readonly SteinbergPair[],
  hulls: readonly bigint[],
  budget: Budget,
  modulo: Modulo = 'nothing',
  ones: readonly Monomial[] = [],
): ProofSearch {
  const inner = [...pairs.flatMap(({ x, y }) => [x, y]), ...ones].reduce((mask, m) => mask | supportOf(m), 0n);
  const insideHulls = [...new Set(hulls.map((hull) => hull & inner))];
  const proof: UsedRelation[] = [];
  let relations = 0;
  for (const [beside, words] of besideOthers(target, degree, inner)) {
    const found = solve(char, degree - countBits(beside), words, pairs, ones, insideHulls, modulo, budget);
    relations += found.relations;
    if (found.proof === undefined) return { relations, cut: found.cut };
    for (const relation of found.proof) proof.push({ ...relation, beside });
  }
  return { proof, relations, cut: false };
}

/** A class as Σ words·[p_S] over the sets S of generators outside of `inner`; the words hold generators of `inner` only. */
function besideOthers(target: Words, degree: number, inner: bigint): ReadonlyMap<bigint, Words> {
  const groups = new Map<bigint, Map<bigint, SignClass>>();
  for (const [mask, b] of target) {
    const [own, beside] = [mask & inner, mask & ~inner];
    const group = groups.get(beside) ?? new Map<bigint, SignClass>();
    groups.set(beside, group);
    // [p_own][p_beside] is ε^k times the sorted word
    const odd = inversions(own, beside) % 2 === 1;
    group.set(own, odd ? multiplySign(0, { x: -1n, y: -1n }, degree - countBits(mask), b) : b);
  }
  return groups;
}

function solve(
  char: CharacteristicClass,
  degree: number,
  target: Words,
  pairs: readonly SteinbergPair[],
  ones: readonly Monomial[],
  hulls: readonly bigint[],
  modulo: Modulo,
  budget: Budget,
): Omit<ProofSearch, 'proof'> & { readonly proof?: readonly Omit<UsedRelation, 'beside'>[] } {
  const spend = (): void => budget.spend('solving for Steinberg relations');
  const ring = wordRing(char, budget);
  const rows = new Rows(char, degree, modulo);
  const lattice = new IntegerLattice(spend);
  const used: { readonly word: Words; readonly pair: SteinbergPair | undefined }[] = [];
  const goal = rows.vector(target, lattice);
  if (lattice.express(goal) !== undefined) return { relations: 0, cut: false, proof: [] };
  const relator = (own: number, value: Words | undefined, support: bigint, pair?: SteinbergPair) =>
    value === undefined ? [] : [{ own, value, support, pair, tried: new Set<bigint>() }];
  const relators = [
    ...ones.flatMap((one) => relator(1, ring.symbol(one), supportOf(one))),
    ...pairs.flatMap((pair) => {
      const [x, y] = [ring.symbol(pair.x), ring.symbol(pair.y)];
      return relator(2, x && y && ring.multiply(1, x, 1, y), supportOf(pair.x) | supportOf(pair.y), pair);
    }),
  ];
  const supports = relators.map(({ support }) => support);
  const sets = growing(hulls, supports);
  for (const hull of sets.slice(0, HULL_LIMIT)) {
    let added = false;
    for (const { own, pair, value, support, tried } of relators) {
      if ((support & ~hull) !== 0n || used.length >= RELATION_LIMIT) continue;
      for (const mask of subsets(hull)) {
        if (tried.has(mask)) continue;
        if (used.length >= RELATION_LIMIT) break;
        tried.add(mask);
        spend();
        for (const word of wordsOf(char, degree - own, mask)) {
          const multiple = ring.multiply(degree - own, word, own, value);
          if (multiple === undefined) continue;
          lattice.insert(rows.vector(multiple, lattice), used.length);
          used.push({ word, pair });
          added = true;
        }
      }
    }
    const found = added ? lattice.express(goal) : undefined;
    if (found !== undefined)
      return {
        relations: used.length,
        cut: false,
        proof: found.flatMap(([label, coefficient]) => {
          const relation = used[label];
          return relation?.pair === undefined ? [] : [{ word: relation.word, pair: relation.pair, coefficient }];
        }),
      };
    if (used.length >= RELATION_LIMIT) break;
  }
  return { relations: used.length, cut: used.length >= RELATION_LIMIT || sets.length > HULL_LIMIT };
}

/** The coordinates of words of one degree: one for each coefficient; torsion enters the lattice with the first use of a row. */
class Rows {
  private readonly places = new Map<string, number>();

  constructor(
    private readonly char: CharacteristicClass,
    private readonly degree: number,
    private readonly modulo: Modulo,
  ) {}

  vector(words: Words, lattice: IntegerLattice): SparseVector {
    const entries: (readonly [number, bigint])[] = [];
    for (const [mask, { x, y }] of words) {
      if (x !== 0n) entries.push([this.place(mask, 'x', lattice), x]);
      if (y !== 0n) entries.push([this.place(mask, 'y', lattice), y]);
    }
    return entries.sort(([a], [b]) => a - b);
  }

  private place(mask: bigint, coordinate: 'x' | 'y', lattice: IntegerLattice): number {
    const name = `${mask}${coordinate}`;
    const known = this.places.get(name);
    if (known !== undefined) return known;
    const place = this.places.size;
    this.places.set(name, place);
    const own = this.degree - countBits(mask);
    const order = orderModulo(this.modulo, this.char, own, coordinate);
    if (order !== 0n) lattice.insert([[place, order]]);
    // h = 2 + η[−1]
    if (this.modulo === 'h' && own === 0) {
      const other = this.place(mask, coordinate === 'x' ? 'y' : 'x', lattice);
      const [here, there] = coordinate === 'x' ? [2n, 1n] : [1n, 2n];
      if (other > place)
        lattice.insert([
          [place, here],
          [other, there],
        ]);
    }
    return place;
  }
}

/** The order of a coefficient of B_* in a degree, 0 for infinite order (see `SignClass`). */
function orderOf(char: CharacteristicClass, degree: number, coordinate: 'x' | 'y'): bigint {
  if (char === 'zero') return 0n;
  if (coordinate === 'y') return char === 'three-mod-four' ? 2n : 1n;
  if (degree === 0) return 0n;
  if (degree < 0) return char === 'three-mod-four' ? 4n : 2n;
  return degree === 1 && char !== 'two' ? 2n : 1n;
}

/** The same modulo η, where 2[−1] = −η[−1][−1] is zero, or modulo h, but for h itself; √−1 = i makes [−1] = h[i]. */
function orderModulo(modulo: Modulo, char: CharacteristicClass, degree: number, coordinate: 'x' | 'y'): bigint {
  const order = orderOf(char, degree, coordinate);
  if (modulo === 'eta') {
    if (degree < 0 || coordinate === 'y') return 1n;
    return degree > 0 && order === 0n ? 2n : order;
  }
  return modulo === 'h' && degree > 0 && char === 'one-mod-four' ? 1n : order;
}

/** The canonical words with these generators in a degree: one coefficient spans them, in its degree 0 two do. */
function wordsOf(char: CharacteristicClass, degree: number, mask: bigint): readonly Words[] {
  const own = degree - countBits(mask);
  const plain = orderOf(char, own, 'x') === 1n ? [] : [{ x: 1n, y: 0n }];
  const twisted = own === 0 && orderOf(char, own, 'y') !== 1n ? [{ x: 0n, y: 1n }] : [];
  return [...plain, ...twisted].map((b) => new Map([[mask, b]]));
}

const supportOf = ({ exponents }: Monomial): bigint =>
  [...exponents.keys()].reduce((mask, i) => mask | (1n << BigInt(i)), 0n);

/** The hulls and the unions of two, of one with the generators of a pair, then of all; small ones first, each once. */
function growing(hulls: readonly bigint[], supports: readonly bigint[]): readonly bigint[] {
  const union = (masks: readonly bigint[]): bigint => masks.reduce((all, mask) => all | mask, 0n);
  const two = hulls.flatMap((a, i) => hulls.slice(i + 1).map((b) => a | b));
  const withPair = hulls.flatMap((a) => supports.map((b) => a | b));
  const ordered = [...hulls, ...two, ...withPair, union(hulls)].sort((a, b) => countBits(a) - countBits(b));
  return [...new Set([...ordered, union([...hulls, ...supports])])];
}

/** The subsets of a mask, small ones first; of a large mask only the small ones. */
function subsets(mask: bigint): readonly bigint[] {
  const bits = lettersOf(mask).map((i) => 1n << BigInt(i));
  let layer: readonly { readonly mask: bigint; readonly next: number }[] = [{ mask: 0n, next: 0 }];
  const all: bigint[] = [];
  while (layer.length > 0 && all.length < RELATION_LIMIT) {
    all.push(...layer.map((subset) => subset.mask));
    layer = layer.flatMap(({ mask: subset, next }) =>
      bits.slice(next).map((bit, i) => ({ mask: subset | bit, next: next + i + 1 })),
    );
  }
  return all;
}
