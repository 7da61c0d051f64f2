import type { Budget } from '../arith/budget';
import type { Decision } from './decidable-field';
import { quotientsOf, verdictsOf } from './judged';
import { searchCounterexample, type Claim, type DecideOver } from './letters-refute';
import type { Counterexample, NamedField } from './outcome';

/** How many steps the search for an example takes: the verdict stands in any case. */
const STEPS = 20_000;

/** Why one field and some values settle a statement about all of them. */
export const COUNTEREXAMPLE = 'A statement about every field and all values fails when it fails for one.';

/**
 * Where a complete comparison over a field of rational functions, or of canonical words, finds the sides different: values in a
 * small field at which they differ too. Then these are what is shown. Without any the decision stays as it is.
 */
export function withExample(claim: Claim, decision: Decision, decideOver: DecideOver, budget: Budget): Decision {
  const degrees = new Set(decision.findings.flatMap(({ same, degree }) => (same ? [] : [degree])));
  if (degrees.size === 0) return decision;
  const found = searchCounterexample({ ...claim, degrees, patience: 1 }, decideOver, STEPS, budget);
  const { counterexample, findings, theorem, tried, limit } = found;
  if (counterexample === undefined) return decision;
  return shownBy(decision, counterexample, { findings, theorem: theorem ?? '' }, { fields: tried, limit });
}

/** A statement in which no letter is left: where it fails over the prime field, that is an example by itself. */
export function withoutLetters({ statement, left, right }: Claim, decision: Decision, field: NamedField): Decision {
  const apart = decision.findings.filter(({ same }) => !same);
  if (apart.length === 0) return decision;
  const sides = [statement.valued(left), statement.valued(right)];
  const counterexample: Counterexample = { field, values: [], statement: { sides, conditions: [] } };
  return shownBy(decision, counterexample, decision, { fields: [], limit: { steps: STEPS, reached: false } });
}

function shownBy(
  decision: Decision,
  counterexample: Counterexample,
  { findings, theorem }: Pick<Decision, 'findings' | 'theorem'>,
  tried: NonNullable<Decision['search']>['tried'],
): Decision {
  const { modEta, modH } = quotientsOf(decision);
  return {
    findings,
    theorem: `${COUNTEREXAMPLE} ${theorem}`.trim(),
    search: { verdicts: verdictsOf(decision), modEta, modH, counterexample, tried },
  };
}
