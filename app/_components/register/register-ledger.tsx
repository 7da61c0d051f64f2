import Link from 'next/link';
import type { IdentitySummary } from '@/lib/contracts/identity-answer';
import type { IdentityQuery, Sort } from '@/lib/contracts/identity-query';
import { FieldName } from './field-name';
import { StateMark, stateWord } from '../marks/state-mark';
import { VerdictMark } from '../marks/verdict-mark';
import { LongFormula } from '../bench/sheet/long-formula';
import { registerHref } from './address';
import { checkMark, checkWord } from './check-words';
import { identityHref } from './identity-address';
import { sayingOf } from './saying';
import { exactMoment, shortDay, shortName } from './telling';

interface Head {
  readonly name: string;
  readonly sort?: 'changed' | 'name' | 'state';
  /** Left out of the stacked entries of a phone. */
  readonly opt?: boolean;
}

const heads: readonly Head[] = [
  { name: 'state', sort: 'state' },
  { name: 'statement', sort: 'name' },
  { name: 'over' },
  { name: 'kept by' },
  { name: 'changed', sort: 'changed' },
  { name: 'last check' },
];

/** Names and states are read from the beginning, changes from the newest. */
const firstOrder = { changed: '-changed', name: 'name', state: 'state' } as const;

const turned = (sort: Sort): Sort => (sort.startsWith('-') ? sort.slice(1) : `-${sort}`) as Sort;

function SortHead({ head, query }: { readonly head: Head; readonly query: IdentityQuery }) {
  if (head.sort === undefined) return <th scope="col">{head.name}</th>;
  const on = query.sort.replace('-', '') === head.sort;
  const next = on ? turned(query.sort) : firstOrder[head.sort];
  const order = on ? (query.sort.startsWith('-') ? 'descending' : 'ascending') : undefined;
  return (
    <th scope="col" aria-sort={order}>
      <Link href={registerHref(query, { sort: next })} scroll={false} replace title={`Sort by ${said[head.sort]}`}>
        {head.name}
      </Link>
    </th>
  );
}

const said = { changed: 'the last change', name: 'name', state: 'state' } as const;

function Entry({ identity }: { readonly identity: IdentitySummary }) {
  const { state, number, name, field, keeper, changedAt, lastCheck } = identity;
  const saying = sayingOf(identity);
  return (
    <tr>
      <td>
        <span className="with-glyph">
          <StateMark of={state} />
          {stateWord[state]}
        </span>
      </td>
      <td className="st">
        <Link href={identityHref(identity.key)} aria-label={`${name}: ${saying.text}`}>
          <LongFormula text={saying.text} tex={saying.tex} />
        </Link>
        <span className="nm">
          {number} · {name}
          {identity.warning && <i>, a warning</i>}
        </span>
      </td>
      <td className="over">
        <FieldName field={field} />
      </td>
      <td className="keeper opt" title={keeper}>
        {shortName(keeper)}
      </td>
      <td className="when num opt">
        <time dateTime={changedAt} title={exactMoment(changedAt)}>
          {shortDay(changedAt)}
        </time>
      </td>
      <td className="when">
        {lastCheck ? (
          <span className="with-glyph">
            <VerdictMark of={checkMark[lastCheck.verdict]} />
            {checkWord[lastCheck.verdict]}
          </span>
        ) : (
          <span className="quiet">never</span>
        )}
      </td>
    </tr>
  );
}

/** The identities found, statement first, its number and name beneath. */
export function RegisterLedger({
  identities,
  query,
  caption,
}: {
  readonly identities: readonly IdentitySummary[];
  readonly query: IdentityQuery;
  readonly caption: string;
}) {
  return (
    <table className="ledger register">
      <caption className="sr">{caption}</caption>
      <thead>
        <tr>
          {heads.map((head) => (
            <SortHead key={head.name} head={head} query={query} />
          ))}
        </tr>
      </thead>
      <tbody>
        {identities.map((identity) => (
          <Entry key={identity.key} identity={identity} />
        ))}
      </tbody>
    </table>
  );
}
