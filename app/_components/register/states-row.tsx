import Link from 'next/link';
import type { IdentityList, IdentityQuery } from '@/lib/contracts/identity-query';
import { StateMark, stateWord } from '../marks/state-mark';
import { registerHref } from './address';

const states = ['draft', 'checked', 'withdrawn'] as const;

/** The states: filter and legend at once, each with how many there are under the other filters. */
export function StatesRow({
  query,
  counts,
}: {
  readonly query: IdentityQuery;
  readonly counts: IdentityList['states'];
}) {
  const all = states.reduce((sum, state) => sum + counts[state], 0);
  return (
    <div className="states" role="group" aria-label="State">
      <Link
        href={registerHref(query, { state: undefined })}
        aria-current={query.state === undefined ? 'true' : undefined}
        scroll={false}
        replace
      >
        All <span className="num">{all}</span>
      </Link>
      {states.map((state) => (
        <Link
          key={state}
          href={registerHref(query, { state })}
          aria-current={query.state === state ? 'true' : undefined}
          scroll={false}
          replace
        >
          <StateMark of={state} />
          {stateWord[state]} <span className="num">{counts[state]}</span>
        </Link>
      ))}
    </div>
  );
}
