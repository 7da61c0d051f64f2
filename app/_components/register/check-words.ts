import type { CheckSummary } from '@/lib/contracts/identity-answer';
import type { Mark } from '../marks/verdict-mark';

export type CheckVerdict = CheckSummary['verdict'];

/** What a check found, in a word. */
export const checkWord: Record<CheckVerdict, string> = {
  equal: 'Equal',
  different: 'Different',
  undecided: 'Undecided',
  stopped: 'Stopped',
  refused: 'Not decided yet',
};

/** Its mark: a check without a verdict leaves the tile unfired. */
export const checkMark: Record<CheckVerdict, Mark> = {
  equal: 'equal',
  different: 'different',
  undecided: 'undecided',
  stopped: 'undecided',
  refused: 'undecided',
};
