import Link from 'next/link';
import type { IdentityList, IdentityQuery } from '@/lib/contracts/identity-query';
import { registerHref } from './address';
import { countFirst, countWithin } from './telling';

interface Props {
  readonly query: IdentityQuery;
  readonly list: IdentityList;
  /** How many stand before this page. */
  readonly before: number;
}

/** "Nine of 12. The other three": where one is, and the way on. */
export function RegisterPages({ query, list, before }: Props) {
  const shown = list.identities.length;
  const left = Math.max(0, list.total - before - shown);
  const next = Math.min(left, query.limit);
  const where =
    before > 0
      ? `${before + 1} to ${before + shown} of ${list.total}.`
      : list.next === undefined
        ? shown === 1
          ? 'One identity.'
          : `${countFirst(shown)} identities.`
        : `${countFirst(shown)} of ${list.total}.`;
  return (
    <nav className="pages row" aria-label="Pages">
      <span />
      <p className="quiet num">
        {where} {before > 0 && <Link href={registerHref(query)}>From the beginning</Link>}
        {before > 0 && list.next !== undefined && ' · '}
        {list.next !== undefined && (
          <Link href={registerHref(query, { cursor: list.next, seen: String(before + shown) })}>
            {left > query.limit || next === 0 ? `The next ${query.limit}` : `The other ${countWithin(left)}`}
          </Link>
        )}
      </p>
    </nav>
  );
}
