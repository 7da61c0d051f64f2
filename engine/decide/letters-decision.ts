import type { Budget } from '../arith/budget';
import { limitedBudget } from '../arith/limited-budget';
import type { Expression } from '../expression/expression';
import type { Condition } from '../expression/statement';
import { elementText } from '../expression/to-text';
import { degreesOf } from '../ring/degrees';
import type { Graded } from '../ring/graded-ring';
import type { Words } from '../ring/word-ring';
import type { Decision } from './decidable-field';
import type { Finding } from './finding';
import { residueFindings, separationFinding } from './letters-findings';
import { seeLetters, type Seen } from './letters-places';
import { proofSearcher, within } from './letters-proof';
import { searchCounterexample, type DecideOver, type Refutation } from './letters-refute';
import type { LettersStatement } from './letters-statement';
import type { SteinbergRelation, Verdict } from './outcome';

/** How many steps each search may take; together they stay well below what a person waits for. */
const STEPS = { places: 10_000, values: 20_000 } as const;

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
  const searcher = proofSearcher(statement, budget);

  const verdicts = new Map<number, Verdict>();
  const relations = new Map<string, SteinbergRelation>();
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
    for (const relation of proof ?? [])
      relations.set(`${elementText(relation.left)} ${elementText(relation.right)}`, relation);
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
  const byRelations = equal && named;
  const modulo = (not: ReadonlySet<number> | undefined, there: boolean): boolean | undefined => {
    if (equal) return true;
    if ((not?.size ?? 0) > 0 || !there) return false;
    const complete = seen !== undefined && [...seen.open].every((degree) => verdicts.get(degree) === 'equal');
    return complete ? true : undefined;
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
        seen?.notModEta,
        refutation.findings.every((finding) => finding.sameModEta),
      ),
      modH: modulo(
        seen?.notModH,
        refutation.findings.every((finding) => finding.sameModH),
      ),
      ...(counterexample && { counterexample }),
      ...(byRelations && { relations: [...relations.values()] }),
      tried: {
        fields: refutation.tried,
        proof: {
          generators: statement.generators.map(({ element }) => element),
          ...searcher.looked,
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
