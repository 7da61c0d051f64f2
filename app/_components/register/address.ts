import type { Route } from 'next';
import type { IdentityQuery } from '@/lib/contracts/identity-query';

/** The keys of the address, in the order in which they are written. */
export const addressKeys = ['words', 'state', 'field', 'tag', 'verdict', 'degree', 'keeper', 'sort', 'cursor'] as const;
export type AddressKey = (typeof addressKeys)[number];

type Changes = Partial<Record<AddressKey | 'seen', string | undefined>>;

/** The address of the register with some of its keys changed. Any change but that of the page leads to the first page. */
export function registerHref(query: Partial<IdentityQuery>, changes: Changes = {}): Route {
  const { cursor: _, limit: __, ...rest } = query;
  const all: Record<string, unknown> = { ...rest, ...changes };
  const search = new URLSearchParams();
  for (const key of [...addressKeys, 'seen']) {
    const value = all[key];
    if (value === undefined || value === '' || (key === 'sort' && value === '-changed')) continue;
    search.set(key, String(value));
  }
  const text = search.toString();
  return (text === '' ? '/register' : `/register?${text}`) as Route;
}
