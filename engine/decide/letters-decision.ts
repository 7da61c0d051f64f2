import type { Budget } from '../arith/budget';
import { degreesOf } from '../ring/degrees';
import type { Graded } from '../ring/graded-ring';
import type { Words } from '../ring/word-ring';
import type { Decision } from './decidable-field';
import type { Finding } from './finding';
import { quotientsOf, verdictsOf } from './judged';
import { COUNTEREXAMPLE } from './letters-example';
import { residueFindings, separationFinding } from './letters-findings';
import { seeLetters, type Seen } from './letters-places';
import { PROOF_STEPS, proofSearcher, within } from './letters-proof';
import { searchCounterexample, type Claim, type DecideOver, type Refutation } from './letters-refute';
import type { LettersStatement } from './letters-statement';
import type { SteinbergRelation, Verdict } from './outcome';

/** How many steps each search may take; together they stay well below what a person waits for. */
const STEPS = { places: 10_000, values: 20_000 } as const;

const RELATIONS =
  'The difference of the sides is an integer combination of multiples of Steinberg relations [x][y] = 0, x + y = 1 (F. Morel, ' +
  'A¹-Algebraic Topology over a Field, LNM 2052, Definition 3.1, number from memory), so it is zero over every field.';

const RESIDUES =
  'A class over k(t) is zero iff its residues at all irreducible polynomials and its specialisation at infinity are (F. Morel, LNM 2052, ' +
  'Theorem 3.24, number from memory); one letter after the other this leads to Q, or to the prime field, and there to ' +
  'signs and residues at primes. A statement in letters holds over every field iff it holds over this one of rational functions.';

const NEITHER =
  'No lawful values at hand separate the sides, and no relations at hand join them. Values were looked for in small fields, so many in each ' +
  `and for at most ${STEPS.values} steps; proofs among sums of products of the factors of the entries, for at most ${PROOF_STEPS} steps with each ` +
  'choice of factors.';

/**
 * Decides over ℚ(letters), or 𝔽_p(letters), where entries are no products of letters alone: residues along one letter after the other
 * as far as residue fields are again fields of rational functions; Steinberg relations among products of the factors of the entries;
 * and values at which the sides differ. A degree in which none of these settles the question is undecided.
 */
export function decideLetters(claim: Claim, decideOver: DecideOver, budget: Budget): Decision {
  const { statement } = claim;
  const [left = [], right = []] = statement.sides;
  const degrees = degreesOf([...left, ...right]);
  const seen = see(statement, budget);
  const searcher = proofSearcher(statement, budget);

  const verdicts = new Map<number, Verdict>();
  const relations: SteinbergRelation[] = [];
  let named = true;
  for (const degree of degrees) {
    if (seen?.separations.has(degree)) {
      verdicts.set(degree, 'different');
      continue;
    }
    const known = seen !== undefined && !seen.open.has(degree);
    const proof = searcher.prove(degree, known ? 2 : 3);
    verdicts.set(degree, known || proof !== undefined ? 'equal' : 'undecided');
    if (proof === undefined) named = false;
    else relations.push(...proof);
  }

  const apart = degrees.some((degree) => verdicts.get(degree) === 'different');
  const wanted = new Set(degrees.filter((degree) => verdicts.get(degree) !== 'equal'));
  const refutation: Refutation =
    wanted.size === 0
      ? { findings: [], tried: [], limit: { steps: STEPS.values, reached: false } }
      : searchCounterexample({ ...claim, degrees: wanted, patience: apart ? 3 : 1 }, decideOver, STEPS.values, budget);
  for (const { degree, same } of refutation.findings) if (!same) verdicts.set(degree, 'different');

  const { counterexample } = refutation;
  const equal = [...verdicts.values()].every((verdict) => verdict === 'equal');
  const byRelations = equal && named;
  const modulo = (what: 'eta' | 'h', not: ReadonlySet<number> | undefined, there: boolean): boolean | undefined => {
    if (equal) return true;
    if ((not?.size ?? 0) > 0 || !there) return false;
    const complete = (degree: number): boolean =>
      verdicts.get(degree) === 'equal' || (seen !== undefined && !seen.open.has(degree));
    return degrees.every((degree) => complete(degree) || searcher.provesModulo(what, degree)) ? true : undefined;
  };
  return {
    findings: counterexample === undefined ? shown(statement, verdicts, seen, searcher.words) : refutation.findings,
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
        'eta',
        seen?.notModEta,
        refutation.findings.every((finding) => finding.sameModEta),
      ),
      modH: modulo(
        'h',
        seen?.notModH,
        refutation.findings.every((finding) => finding.sameModH),
      ),
      ...(counterexample && { counterexample }),
      ...(byRelations && { relations }),
      tried: {
        fields: refutation.tried,
        limit: refutation.limit,
        proof: {
          limit: { steps: PROOF_STEPS, reached: searcher.reached() },
          generators: statement.generators.map(({ element }) => element),
          ...searcher.looked,
          chains: seen?.chains ?? 0,
        },
      },
    },
  };
}

/**
 * What maps over k(t) leave open, settled by the searches as far as they go. Both are right, so in each degree the one that knows
 * more is followed; findings of a counterexample are shown, if there is one.
 */
export function settledBySearch(maps: Decision, searches: Decision): Decision {
  const { search } = searches;
  if (search === undefined) return maps;
  const verdicts = new Map(search.verdicts);
  for (const [degree, verdict] of verdictsOf(maps)) if (verdict !== 'undecided') verdicts.set(degree, verdict);
  const settled = [...verdicts.values()].every((verdict) => verdict !== 'undecided');
  const found = search.counterexample !== undefined || search.relations !== undefined;
  const { findings, theorem } = found ? searches : maps;
  const known = quotientsOf(maps);
  return {
    findings,
    theorem,
    ...(!settled && maps.open && { open: maps.open }),
    search: { ...search, verdicts, modEta: known.modEta ?? search.modEta, modH: known.modH ?? search.modH },
  };
}

/** What the places tell; nothing where there are too many of them. */
function see({ ring, entries, sides: [left = [], right = []] }: LettersStatement, budget: Budget): Seen | undefined {
  return within(STEPS.places, budget, (limited) =>
    seeLetters({ ...ring, budget: limited }, entries, [left, right], limited),
  );
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
