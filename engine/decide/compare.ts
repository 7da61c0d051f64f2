import type { Budget } from '../arith/budget';
import type { Expression } from '../expression/expression';
import type { Condition } from '../expression/statement';
import { expressionText } from '../expression/to-text';
import type { DecidableField, Open, Search } from './decidable-field';
import type { Finding } from './finding';
import type { Compared, CompareOutcome, ComparedDegree, Evidence, MapName, Separating, Verdict } from './outcome';

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
  const { findings, theorem, open = [], search } = field.decide(left, right, conditions, budget);
  const unseen = [...(search?.verdicts.keys() ?? []), ...open.map(({ degree }) => degree)];
  const byDegree = new Map<number, Finding[]>(unseen.map((degree) => [degree, []]));
  for (const finding of findings) {
    const here = byDegree.get(finding.degree);
    if (here === undefined) byDegree.set(finding.degree, [finding]);
    else here.push(finding);
  }
  const parts = [...byDegree]
    .sort(([a], [b]) => b - a)
    .map(([degree, here]): ComparedDegree => ({
      degree,
      verdict: search?.verdicts.get(degree) ?? verdictOf(here, isOpen(open, degree)),
      compared: here.map(compared),
    }));
  const separating = firstDifference(findings);
  return {
    verdict: overall(parts),
    parts,
    sideConditions: field.sideConditions([left, right], conditions, budget),
    evidence: {
      kind: search?.counterexample === undefined ? 'invariants' : 'counterexample',
      ...(separating && { separating: describe(separating) }),
      theorem: withOpen(theorem, open),
      ...(search === undefined ? quotients(findings, open) : searched(search)),
    },
  };
}

const verdictOf = (findings: readonly Finding[], open: boolean): Verdict =>
  findings.some((finding) => !finding.same) ? 'different' : open ? 'undecided' : 'equal';

const isOpen = (open: readonly Open[], degree: number): boolean =>
  open.some((part) => part.verdict && part.degree === degree);

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

/** What is known modulo η and modulo h; what is open stays out. */
function quotients(findings: readonly Finding[], open: readonly Open[]): Pick<Evidence, 'modEta' | 'modH'> {
  const modEta = findings.every((finding) => finding.sameModEta);
  const modH = findings.every((finding) => finding.sameModH);
  return {
    ...(!(modEta && open.some((part) => part.modEta)) && { modEta }),
    ...(!(modH && open.some((part) => part.modH)) && { modH }),
  };
}

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

function describe(finding: Finding): Separating {
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
    sentence: `Different in degree ${finding.degree}${where}. There ${values}. ${finding.reason()}`,
  };
}
