import type { Budget } from '../arith/budget';
import { limitedBudget, unlessExhausted } from '../arith/limited-budget';
import { factoredAtoms } from '../derive/factored-atoms';
import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import type { Condition } from '../expression/statement';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import type { Graded } from '../ring/graded-ring';
import { characteristicClass } from '../ring/sign-ring';
import { tabledRing } from '../ring/tabled-ring';
import { forEachEntry, type Term } from '../ring/term';
import { wordRing, type Monomial, type Words } from '../ring/word-ring';
import type { Decision } from './decidable-field';
import type { Finding } from './finding';
import { residueFindings, separationFinding } from './letters-findings';
import { seeLetters, type Seen } from './letters-places';
import { searchCounterexample, type DecideOver, type Refutation } from './letters-refute';
import { monomialAt, type LettersStatement } from './letters-statement';
import type { SteinbergRelation, Verdict } from './outcome';
import { steinbergPairs, type SteinbergPair } from './steinberg-pairs';
import { searchProof, type ProofSearch } from './steinberg-proof';

/** How many steps each search may take; together they stay well below what a person waits for. */
const STEPS = { places: 30_000, words: 2_000, pairs: 3_000, proof: 3_000, values: 20_000 } as const;

const COUNTEREXAMPLE = 'A statement about every field and all values fails when it fails for one.';

const RELATIONS =
  'The difference of the sides is an integer combination of multiples of Steinberg relations [x][y] = 0, x + y = 1 (F. Morel, ' +
  'A¹-Algebraic Topology over a Field, LNM 2052, Definition 3.1, number from memory), so it is zero over every field.';

const RESIDUES =
  'A class over k(t) is zero iff its residues at all irreducible polynomials and its specialisation at infinity are (F. Morel, LNM 2052, ' +
  'Theorem 3.24, number from memory); one letter after the other this leads to Q, or to the prime field, and there to ' +
  'signs and residues at primes. A statement in letters holds over every field iff it holds over this one of rational functions.';

const NEITHER =
  'No lawful values at hand separate the sides, and no relations at hand join them; both searches ended at their limits.';

/**
 * Decides over ℚ(letters), or 𝔽_p(letters), where entries are no products of letters alone: residues along one letter after the other
 * as far as residue fields are again fields of rational functions; Steinberg relations among products of the factors of the entries;
 * and values at which the sides differ. A degree in which none of these settles the question is undecided.
 */
export function decideLetters(
  sides: readonly [Expression, Expression],
  conditions: readonly Condition[],
  statement: LettersStatement,
  decideOver: DecideOver,
  budget: Budget,
): Decision {
  const [left = [], right = []] = statement.sides;
  const degrees = degreesOf([...left, ...right]);
  const seen = see(statement, budget);
  const words = wordsOf(statement, budget);
  const pairs = words === undefined ? [] : pairsOf(statement, budget);

  const verdicts = new Map<number, Verdict>();
  const used = new Set<SteinbergPair>();
  const unnamed: number[] = [];
  let relations = 0;
  for (const degree of degrees) {
    if (seen?.separations.has(degree)) {
      verdicts.set(degree, 'different');
      continue;
    }
    const known = seen !== undefined && !seen.open.has(degree);
    verdicts.set(degree, known ? 'equal' : 'undecided');
    const found = words && prove(statement, degree, words, pairs, budget);
    relations += found?.relations ?? 0;
    if (found?.proof !== undefined) {
      verdicts.set(degree, 'equal');
      for (const { pair } of found.proof) used.add(pair);
    } else if (known) unnamed.push(degree);
  }

  const apart = degrees.some((degree) => verdicts.get(degree) === 'different');
  const wanted = new Set(degrees.filter((degree) => verdicts.get(degree) !== 'equal'));
  const refutation: Refutation =
    wanted.size === 0
      ? { findings: [], tried: [] }
      : searchCounterexample(
          { left: sides[0], right: sides[1], conditions, statement, degrees: wanted, patience: apart ? 3 : 1 },
          decideOver,
          limitedBudget(budget, STEPS.values),
        );
  for (const { degree, same } of refutation.findings) if (!same) verdicts.set(degree, 'different');

  const { counterexample } = refutation;
  const equal = [...verdicts.values()].every((verdict) => verdict === 'equal');
  const byRelations = equal && unnamed.length === 0;
  const modulo = (not: ReadonlySet<number> | undefined, there: boolean): boolean | undefined => {
    if (equal) return true;
    if ((not?.size ?? 0) > 0 || !there) return false;
    const complete = seen !== undefined && [...seen.open].every((degree) => verdicts.get(degree) === 'equal');
    return complete ? true : undefined;
  };
  return {
    findings: counterexample === undefined ? shown(statement, verdicts, seen, words) : refutation.findings,
    theorem:
      counterexample !== undefined
        ? `${COUNTEREXAMPLE} ${refutation.theorem ?? ''}`.trim()
        : byRelations
          ? RELATIONS
          : equal || apart
            ? RESIDUES
            : NEITHER,
    search: {
      verdicts,
      modEta: modulo(
        seen?.notModEta,
        refutation.findings.every((finding) => finding.sameModEta),
      ),
      modH: modulo(
        seen?.notModH,
        refutation.findings.every((finding) => finding.sameModH),
      ),
      ...(counterexample && { counterexample }),
      ...(byRelations && { relations: [...used].map((pair) => written(statement, pair)) }),
      tried: {
        fields: refutation.tried,
        proof: {
          generators: statement.generators.map(({ element }) => element),
          pairs: pairs.length,
          relations,
          chains: seen?.chains ?? 0,
        },
      },
    },
  };
}

/** What the places tell; nothing where there are too many of them. */
function see({ ring, entries, sides: [left = [], right = []] }: LettersStatement, budget: Budget): Seen | undefined {
  return within(STEPS.places, budget, (limited) =>
    seeLetters({ ...ring, budget: limited }, entries, [left, right], limited),
  );
}

/** The canonical words of both sides in the factors of the entries; nothing where there are too many of them. */
function wordsOf(
  { characteristic, monomials, sides }: LettersStatement,
  budget: Budget,
): readonly Graded<Words>[] | undefined {
  return within(STEPS.words, budget, (limited) => {
    const ring = tabledRing(wordRing(characteristicClass(characteristic), limited), monomialAt(monomials));
    return sides.map((terms) => evaluate(terms, ring, limited));
  });
}

const pairsOf = ({ ring, generators }: LettersStatement, budget: Budget): readonly SteinbergPair[] =>
  within(STEPS.pairs, budget, (limited) => steinbergPairs({ ...ring, budget: limited }, generators, limited)) ?? [];

function prove(
  { characteristic, monomials, sides }: LettersStatement,
  degree: number,
  [left, right]: readonly Graded<Words>[],
  pairs: readonly SteinbergPair[],
  budget: Budget,
): ProofSearch | undefined {
  const char = characteristicClass(characteristic);
  const hulls = sides.flatMap((terms) => terms.map((term) => hullOf(term, monomials)));
  return within(STEPS.proof, budget, (limited) => {
    const ring = wordRing(char, limited);
    const [l, r] = [left?.get(degree), right?.get(degree)];
    const minus = r && ring.negate(degree, r);
    const target = l === undefined || minus === undefined ? (l ?? minus) : ring.add(degree, l, minus);
    if (target === undefined) return { proof: [], relations: 0 };
    return searchProof(char, degree, target, pairs, [...new Set(hulls)], limited);
  });
}

/** The generators in the entries of a term, as a bit mask. */
function hullOf(term: Term<number>, monomials: readonly Monomial[]): bigint {
  let hull = 0n;
  forEachEntry(term, (place) => {
    for (const i of monomialAt(monomials)(place).exponents.keys()) hull |= 1n << BigInt(i);
  });
  return hull;
}

/** What is shown where no counterexample is: residues of both sides, or the end of a chain at which they differ. */
function shown(
  statement: LettersStatement,
  verdicts: ReadonlyMap<number, Verdict>,
  seen: Seen | undefined,
  words: readonly Graded<Words>[] | undefined,
): readonly Finding[] {
  return [...verdicts].flatMap(([degree, verdict]): readonly Finding[] => {
    const separation = seen?.separations.get(degree);
    if (separation !== undefined) return [separationFinding(statement, separation)];
    if (verdict !== 'equal' || words === undefined) return [];
    return residueFindings(statement, degree, words[0]?.get(degree));
  });
}

const written = ({ generators }: LettersStatement, { x, y }: SteinbergPair): SteinbergRelation => {
  const atoms = factoredAtoms(generators.map(({ element }) => element));
  const write = ({ negative, exponents }: Monomial): Element => atoms.write({ negative, powers: [...exponents] });
  return { left: write(x), right: write(y) };
};

/** The outcome of a search that takes at most so many steps; nothing when it takes more, or grows past a limit on size. */
function within<T>(steps: number, budget: Budget, search: (limited: Budget) => T): T | undefined {
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
