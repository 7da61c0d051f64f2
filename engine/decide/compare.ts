import type { Budget } from '../arith/budget';
import type { Expression } from '../expression/expression';
import type { Condition } from '../expression/statement';
import { elementText, expressionText } from '../expression/to-text';
import type { DecidableField, Open, Search } from './decidable-field';
import type { Finding } from './finding';
import { quotientsOf, verdictsOf } from './judged';
import type {
  Compared,
  CompareOutcome,
  ComparedDegree,
  Counterexample,
  Evidence,
  MapName,
  Separating,
  Verdict,
} from './outcome';

/**
 * Decides left = right in K^MW_*(F) by homomorphisms, degree by degree, never by expansion.
 *
 * Two classes are equal iff they agree in Milnor K-theory and in the Witt ring (the pull-back theorem: F. Morel, Comment. Math. Helv.
 * 79, 2004; S. Gille, S. Scully, C. Zhong, Adv. Math. 286, 2016); which maps see all of both depends on the field and is named in
 * `evidence.theorem`. Throws a Refusal for entries that are no units, conditions that cannot be used and limits that are passed.
 */
export function compare(
  field: DecidableField,
  left: Expression,
  right: Expression,
  conditions: readonly Condition[],
  budget: Budget,
): CompareOutcome {
  const decision = field.decide(left, right, conditions, budget);
  const { findings, theorem, open = [], search } = decision;
  const verdicts = search?.verdicts ?? verdictsOf(decision);
  const byDegree = new Map<number, Finding[]>([...verdicts.keys()].map((degree) => [degree, []]));
  for (const finding of findings) byDegree.get(finding.degree)?.push(finding);
  const parts = [...byDegree]
    .sort(([a], [b]) => b - a)
    .map(([degree, here]): ComparedDegree => ({
      degree,
      verdict: verdicts.get(degree) ?? 'undecided',
      compared: here.map(compared),
    }));
  const separating = firstDifference(findings);
  return {
    verdict: overall(parts),
    parts,
    sideConditions: field.sideConditions([left, right], conditions, budget),
    evidence: {
      kind: search?.counterexample === undefined ? 'invariants' : 'counterexample',
      ...(separating && { separating: describe(separating, search?.counterexample) }),
      theorem: withOpen(theorem, open),
      ...(search === undefined ? quotientsOf(decision) : searched(search)),
    },
  };
}

/** The theorem, and what the maps do not see. */
function withOpen(theorem: string, open: readonly Open[]): string {
  const missing = new Set(open.filter(({ verdict }) => verdict).map((part) => part.missing));
  return missing.size === 0 ? theorem : `${theorem} Not settled: ${[...missing].join('; ')}.`;
}

const overall = (parts: readonly ComparedDegree[]): Verdict =>
  parts.some(({ verdict }) => verdict === 'different')
    ? 'different'
    : parts.some(({ verdict }) => verdict === 'undecided')
      ? 'undecided'
      : 'equal';

const searched = ({ modEta, modH, counterexample, relations, tried }: Search): Partial<Evidence> => ({
  ...(modEta !== undefined && { modEta }),
  ...(modH !== undefined && { modH }),
  ...(counterexample && { counterexample }),
  ...(relations && { relations }),
  tried,
});

function compared(finding: Finding): Compared {
  const left = finding.left();
  return {
    map: finding.map,
    ...(finding.place !== undefined && { place: finding.place }),
    left,
    right: finding.same ? left : finding.right(),
    same: finding.same,
    zero: finding.zero,
    target: finding.target(),
  };
}

/** The first difference in the highest degree in which there is one: the most elementary map comes first. */
function firstDifference(findings: readonly Finding[]): Finding | undefined {
  return findings
    .filter((finding) => !finding.same)
    .reduce<Finding | undefined>(
      (best, next) => (best === undefined || next.degree > best.degree ? next : best),
      undefined,
    );
}

const NOUN: Readonly<Record<MapName, string>> = {
  rank: 'rank',
  signature: 'signature',
  residue: 'residue',
  specialisation: 'specialisation',
  product: 'product of entries',
  symbol: 'symbol',
  discriminant: 'discriminant',
  hasse: 'Hasse invariant',
  class: 'class',
  word: 'coefficient',
};

/** The field and the values of a counterexample, in words. */
function failure({ field, values }: Counterexample): string {
  const given = values.map(({ letter, value }) => `${letter} = ${elementText(value)}`).join(', ');
  return `It fails over ${field.name}${given === '' ? '' : ` with ${given}`}. `;
}

function describe(finding: Finding, counterexample: Counterexample | undefined): Separating {
  const [left, right] = [finding.left(), finding.right()];
  const where =
    finding.place === undefined ? '' : finding.place === 'real' ? ', at the real place' : `, at ${finding.place}`;
  const values = `the left side has ${NOUN[finding.map]} ${expressionText(left)} and the right side ${expressionText(right)}`;
  return {
    degree: finding.degree,
    map: finding.map,
    ...(finding.place !== undefined && { place: finding.place }),
    left,
    right,
    sentence: `${counterexample === undefined ? '' : failure(counterexample)}Different in degree ${finding.degree}${where}. There ${values}. ${finding.reason()}`,
  };
}
