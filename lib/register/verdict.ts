import type { CompareAnswer } from '@/lib/contracts/compare';
import { type Problem, problemOf } from '@/lib/contracts/problem';
import type { CheckVerdict, IdentityState } from '@/models/identity-words';

/** The state that the last check of the current revision gives: checked iff it confirms what the revision says. */
export const stateOf = (verdict: CheckVerdict | null, warning: boolean): Exclude<IdentityState, 'withdrawn'> =>
  verdict === (warning ? 'different' : 'equal') ? 'checked' : 'draft';

/** Why a revision with this verdict is not kept at all: the engine has shown that it is not as it says. */
export function contradiction(verdict: CheckVerdict, warning: boolean, sentence: string): Problem | undefined {
  if (verdict === 'different' && !warning)
    return problemOf('sides-differ', `${sentence} Keep it as a warning, or change it.`);
  if (verdict === 'equal' && warning)
    return problemOf(
      'sides-agree',
      `${sentence} A warning says that they are different: keep it without the warning, or change it.`,
      { part: 'warning' },
    );
  return undefined;
}

/** The degrees of a comparison, highest first, those of every step. */
export const degreesOf = ({ chain, parts }: CompareAnswer): number[] =>
  [...new Set((chain?.flatMap((step) => step.parts) ?? parts).map(({ degree }) => degree))].sort((a, b) => b - a);

/** What a comparison found, in words. `sides` names what was compared. */
export function sentenceOf(answer: CompareAnswer, sides = 'The sides'): string {
  const step = answer.firstWrong === undefined ? '' : `In step ${answer.firstWrong + 1} of the chain: `;
  if (answer.verdict === 'different')
    return `${sides} are different. ${step}${answer.evidence.separating?.sentence ?? ''}`.trimEnd();
  if (answer.verdict === 'undecided')
    return `Undecided: nothing that was compared tells ${lowered(sides)} apart, and no argument was found that they are equal.`;
  return `${sides} are equal${inDegrees(degreesOf(answer))}.`;
}

const lowered = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);

function inDegrees(degrees: readonly number[]): string {
  if (degrees.length === 0) return '';
  const last = degrees.at(-1);
  return degrees.length === 1 ? `, in degree ${last}` : `, in degrees ${degrees.slice(0, -1).join(', ')} and ${last}`;
}

/** What a check found, when its own sentence is not kept. */
export const plainSentence: Readonly<Record<CheckVerdict, string>> = {
  equal: 'The sides are equal.',
  different: 'The sides are different.',
  undecided: 'Undecided.',
  stopped: 'The check was stopped at its limit.',
  refused: 'This version of the engine does not decide it.',
};
