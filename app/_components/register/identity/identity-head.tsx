import Link from 'next/link';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { StateMark, stateWord } from '../../marks/state-mark';
import { identityHref } from '../identity-address';
import { longDay } from '../telling';
import { IdentityActions } from './identity-actions';
import type { Viewer } from './viewer';

const lastFound = {
  equal: 'The last check found the sides equal, which is not what it says.',
  different: 'The last check found the sides different.',
  undecided: 'The last check did not decide it.',
  stopped: 'The last check was stopped at its limit.',
  refused: 'This engine does not decide it yet.',
} as const;

/** How it stands, in a sentence or two. */
function Stands({ identity, viewer, past }: { identity: IdentityAnswer; viewer: Viewer; past: boolean }) {
  const { state, keeper, createdAt, revision, current, revisions, group, lastCheck, withdrawnReason } = identity;
  const written = revisions.find(({ number }) => number === revision);
  if (past)
    return (
      <p className="stands">
        <b>
          Revision {revision} of {current}.
        </b>{' '}
        {written?.author} wrote it on {longDay(written?.at ?? createdAt)}.{' '}
        <Link href={identityHref(identity.key)}>To the current one</Link>
      </p>
    );
  const of = viewer.own ? '' : ` for ${group.name}`;
  return (
    <p className="with-glyph stands">
      <StateMark of={state} />
      <span>
        <b>
          {stateWord[state]}
          {identity.warning && state !== 'withdrawn' ? ', a warning.' : '.'}
        </b>{' '}
        {state === 'draft' && lastCheck ? `${lastFound[lastCheck.verdict]} ` : ''}
        {state === 'withdrawn' ? `${withdrawnReason ?? ''} ` : ''}
        {keeper} kept it{of} on {longDay(createdAt)}; revision {revision}.
      </span>
    </p>
  );
}

interface Props {
  readonly identity: IdentityAnswer;
  readonly viewer: Viewer;
  /** An earlier revision is shown. */
  readonly past: boolean;
}

/** The slab of an identity: its name, how it stands, and what can be done with it. */
export function IdentityHead({ identity, viewer, past }: Props) {
  return (
    <section className="slab" aria-label="The identity">
      <div className="row">
        <p className="side to-title">identity {identity.number}</p>
        <div className="headed">
          <div>
            <h1>{identity.name}</h1>
            <Stands identity={identity} viewer={viewer} past={past} />
          </div>
          {viewer.mayWrite && !past && (
            <IdentityActions
              identityKey={identity.key}
              number={identity.number}
              revision={identity.revision}
              withdrawn={identity.state === 'withdrawn'}
            />
          )}
        </div>
      </div>
    </section>
  );
}
