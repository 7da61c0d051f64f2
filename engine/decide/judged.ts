import type { Decision } from './decidable-field';
import type { Evidence, Verdict } from './outcome';

/** What maps say by themselves, degree by degree: a difference settles it, and what they do not see leaves it open. */
export function verdictsOf({ findings, open = [] }: Decision): ReadonlyMap<number, Verdict> {
  const verdicts = new Map<number, Verdict>();
  for (const { degree, verdict } of open)
    if (verdict || !verdicts.has(degree)) verdicts.set(degree, verdict ? 'undecided' : 'equal');
  for (const { degree, same } of findings)
    if (!same) verdicts.set(degree, 'different');
    else if (!verdicts.has(degree)) verdicts.set(degree, 'equal');
  return verdicts;
}

/** What is known modulo η and modulo h; what is open stays out. */
export function quotientsOf({ findings, open = [] }: Decision): Pick<Evidence, 'modEta' | 'modH'> {
  const modEta = findings.every((finding) => finding.sameModEta);
  const modH = findings.every((finding) => finding.sameModH);
  return {
    ...(!(modEta && open.some((part) => part.modEta)) && { modEta }),
    ...(!(modH && open.some((part) => part.modH)) && { modH }),
  };
}
