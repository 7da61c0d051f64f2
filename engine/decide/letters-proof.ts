import type { Budget } from '../arith/budget';
import { limitedBudget, unlessExhausted } from '../arith/limited-budget';
import { factoredAtoms } from '../derive/factored-atoms';
import type { Element } from '../expression/element';
import { Refusal } from '../expression/refusal';
import { evaluate } from '../ring/evaluate';
import type { Graded, GradedRing } from '../ring/graded-ring';
import { characteristicClass } from '../ring/sign-ring';
import { tabledRing } from '../ring/tabled-ring';
import { forEachEntry, type Term } from '../ring/term';
import { countBits, wordRing, type Monomial, type Words } from '../ring/word-ring';
import { completedSquares, loneLetters, partialSums, type Additions } from './letters-additions';
import { generated, type Generator } from './letters-generators';
import { monomialAt, type LettersStatement } from './letters-statement';
import { writeWords } from './letters-words';
import type { SteinbergRelation } from './outcome';
import { steinbergPairs } from './steinberg-pairs';
import { searchProof, type Modulo, type UsedRelation } from './steinberg-proof';
import type { SteinbergPair } from './steinberg-triples';

/** How many steps may be taken: writing words, looking for pairs, solving in one degree. */
const STEPS = { words: 2_000, pairs: 8_000, solving: 20_000 } as const;

/** The limit on the work with the units of one choice in one degree. */
export const PROOF_STEPS = STEPS.words + STEPS.pairs + STEPS.solving;

/** A search for proofs by Steinberg relations, degree by degree. */
export interface ProofSearcher {
  /** The words of both sides in the factors of their entries; absent where there are too many of them. */
  readonly words: readonly Graded<Words>[] | undefined;
  /**
   * Multiples of Steinberg relations that add up to left − right in a degree, `undefined` where none are found. With effort 1 the
   * factors of the entries are the generators, with 2 letters and completed squares are added, with 3 partial sums too.
   */
  prove(degree: number, effort: 1 | 2 | 3): readonly SteinbergRelation[] | undefined;
  /** Whether the same proves them equal modulo η, or modulo h. */
  provesModulo(modulo: 'eta' | 'h', degree: number): boolean;
  /** What has been looked at so far. */
  readonly looked: { readonly pairs: number; readonly relations: number };
  /** Whether a limit ended something. */
  readonly reached: () => boolean;
}

interface Looked {
  pairs: number;
  relations: number;
}

interface Ended {
  early: boolean;
}

/** Generators with the words in them and the pairs among their products. */
interface Frame {
  readonly generators: readonly Generator[];
  readonly words: readonly Graded<Words>[];
  readonly hulls: readonly bigint[];
  readonly pairs: readonly SteinbergPair[];
}

/** Looks for proofs with the factors of the entries as generators, then with more units beside them. */
export function proofSearcher(statement: LettersStatement, budget: Budget): ProofSearcher {
  const { ring, entries, generators, monomials } = statement;
  const looked: Looked = { pairs: 0, relations: 0 };
  const ended = { early: false };
  const plain = frameOf(statement, generators, monomials, monomials, ended, budget);
  const extended = (additions: readonly Additions[]): Frame | undefined => {
    const units = additions.flatMap((more) => more.units);
    const candidates = additions.flatMap((more) => more.candidates);
    if (units.length === 0) return undefined;
    const { generators: all, monomials: of } = generated(ring, [...entries, ...units, ...candidates]);
    const own = of.slice(0, entries.length);
    return frameOf(statement, all, own, [...own, ...of.slice(entries.length + units.length)], ended, budget);
  };
  const squares = [loneLetters(statement), completedSquares(statement)];
  const frames: (() => Frame | undefined)[] = [
    () => plain,
    once(() => extended(squares)),
    once(() => {
      const sums = partialSums(statement);
      return sums.units.length === 0 ? undefined : extended([...squares, sums]);
    }),
  ];
  const searched = (degree: number, effort: number, modulo: Modulo): readonly SteinbergRelation[] | undefined => {
    for (const next of frames.slice(0, effort)) {
      const frame = next();
      if (frame === undefined) continue;
      looked.pairs = Math.max(looked.pairs, frame.pairs.length);
      const found = search(statement, frame, degree, modulo, looked, ended, budget);
      if (found !== undefined) return found;
    }
    return undefined;
  };
  return {
    words: plain?.words,
    looked,
    reached: () => ended.early,
    prove: (degree, effort) => searched(degree, effort, 'nothing'),
    provesModulo: (modulo, degree) => searched(degree, 2, modulo) !== undefined,
  };
}

function search(
  { characteristic }: LettersStatement,
  { generators, words: [left, right], pairs, hulls }: Frame,
  degree: number,
  modulo: Modulo,
  looked: Looked,
  ended: Ended,
  budget: Budget,
): readonly SteinbergRelation[] | undefined {
  const char = characteristicClass(characteristic);
  const result = within(STEPS.solving, budget, (limited) => {
    const ring = wordRing(char, limited);
    const [l, r] = [left?.get(degree), right?.get(degree)];
    const minus = r && ring.negate(degree, r);
    const target = l === undefined || minus === undefined ? (l ?? minus) : ring.add(degree, l, minus);
    if (target === undefined) return { relations: [] };
    const found = searchProof(char, degree, target, pairs, hulls, limited, modulo);
    looked.relations += found.relations;
    if (found.cut) ended.early = true;
    return { relations: found.proof && writeProof(ring, generators, degree, found.proof) };
  });
  if (result === undefined) ended.early = true;
  return result?.relations;
}

/** The multiples of each pair taken together. */
function writeProof(
  ring: GradedRing<Monomial, Words>,
  generators: readonly Generator[],
  degree: number,
  proof: readonly UsedRelation[],
): readonly SteinbergRelation[] {
  const elements = generators.map(({ element }) => element);
  const atoms = factoredAtoms(elements);
  const write = ({ negative, exponents }: Monomial): Element => atoms.write({ negative, powers: [...exponents] });
  const multiples = new Map<SteinbergPair, Words | undefined>();
  for (const { pair, coefficient, word, beside } of proof) {
    // [x][y] commutes with symbols, so what stands beside it may stand before it
    const own = degree - 2 - countBits(beside);
    const scaled = new Map([...word].map(([mask, { x, y }]) => [mask, { x: coefficient * x, y: coefficient * y }]));
    const multiple = ring.multiply(own, scaled, countBits(beside), new Map([[beside, { x: 1n, y: 0n }]]));
    const present = multiples.get(pair);
    multiples.set(pair, present && multiple ? ring.add(degree - 2, present, multiple) : (present ?? multiple));
  }
  return [...multiples].flatMap(([{ x, y }, words]) =>
    words === undefined ? [] : [{ times: writeWords(elements, degree - 2, words), left: write(x), right: write(y) }],
  );
}

/** Nothing where the words, or the polynomials, are too long. */
function frameOf(
  { characteristic, ring, sides }: LettersStatement,
  generators: readonly Generator[],
  monomials: readonly Monomial[],
  candidates: readonly Monomial[],
  ended: Ended,
  budget: Budget,
): Frame | undefined {
  const frame = within(STEPS.words, budget, (limited) => {
    const words = tabledRing(wordRing(characteristicClass(characteristic), limited), monomialAt(monomials));
    const valued = sides.map((terms) => evaluate(terms, words, limited));
    const { pairs, complete } = steinbergPairs(ring, generators, candidates, limitedBudget(budget, STEPS.pairs));
    if (!complete) ended.early = true;
    const hulls = new Set(sides.flatMap((terms) => terms.map((term) => hullOf(term, monomials))));
    return { generators, words: valued, pairs, hulls: [...hulls] };
  });
  if (frame === undefined) ended.early = true;
  return frame;
}

/** The generators in the entries of a term, as a bit mask. */
function hullOf(term: Term<number>, monomials: readonly Monomial[]): bigint {
  let hull = 0n;
  forEachEntry(term, (place) => {
    for (const i of monomialAt(monomials)(place).exponents.keys()) hull |= 1n << BigInt(i);
  });
  return hull;
}

function once<T>(make: () => T): () => T {
  let made: { readonly value: T } | undefined;
  return () => (made ??= { value: make() }).value;
}

/** The outcome of a search that takes at most so many steps; nothing when it takes more, or grows past a limit on size. */
export function within<T>(steps: number, budget: Budget, search: (limited: Budget) => T): T | undefined {
  return unlessExhausted(
    () => {
      try {
        return search(limitedBudget(budget, steps));
      } catch (error) {
        if (error instanceof Refusal && error.code === 'size') return undefined;
        throw error;
      }
    },
    () => undefined,
  );
}
