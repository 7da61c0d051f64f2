import type { ReactNode } from 'react';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { VerdictMark } from '../../marks/verdict-mark';
import { PageIndex } from '../../shell/page-index';
import { checkMark, checkWord } from '../check-words';
import { exactMoment, shortDay } from '../telling';

const shownChecks = 12;

interface Props {
  readonly identity: IdentityAnswer;
  /** What can be done with it. */
  readonly children: ReactNode;
}

/** The notes at the edge: what can be done, the index of the page, and the history of checks. */
export function IdentityNotes({ identity, children }: Props) {
  const { checks, revision, remark } = identity;
  const subjects = ['statement', 'evidence', 'revisions', ...(remark === undefined ? [] : ['remark']), 'cite'];
  const several = new Set(checks.map((check) => check.revision)).size > 1;
  return (
    <aside className="notes from-top" aria-label="About this identity">
      {children}
      <PageIndex subjects={subjects.map((id) => ({ id, name: id }))} />
      <div>
        <h2>history of checks</h2>
        {checks.length === 0 ? (
          <p>It has not been checked.</p>
        ) : (
          <ul className="checks num">
            {checks.slice(0, shownChecks).map((check, index) => (
              <li key={index} title={`${exactMoment(check.at)}, in ${check.durationMs} ms`}>
                <VerdictMark of={checkMark[check.verdict]} />
                <span>
                  <span className="sr">{checkWord[check.verdict]}, </span>
                  {shortDay(check.at)}, engine {check.engine}
                  {several && check.revision !== revision ? `, revision ${check.revision}` : ''}
                </span>
              </li>
            ))}
          </ul>
        )}
        {checks.length > shownChecks && <p className="quiet">and {checks.length - shownChecks} earlier</p>}
      </div>
    </aside>
  );
}
