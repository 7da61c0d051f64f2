import { type IdentityQuery, identityQuery } from '@/lib/contracts/identity-query';
import { addressKeys } from './address';

/** What the address of the register says: the query, and how many identities stand before this page of it. */
export interface RegisterAddress {
  readonly query: IdentityQuery;
  readonly before: number;
}

export type Given = Readonly<Record<string, string | string[] | undefined>>;

/** Identities on one page. */
const pageLength = '25';

/** Reads the address. What cannot be is left out, so that a mistyped address still shows the register. */
export function readAddress(given: Given): RegisterAddress {
  const texts = addressKeys.flatMap((key) => {
    const text = given[key];
    const one = (Array.isArray(text) ? text[0] : text)?.trim().slice(0, key === 'cursor' ? 600 : 500);
    const kept = key === 'words' ? one?.slice(0, 200) : one;
    return kept && identityQuery.shape[key].safeParse(kept).success ? [[key, kept] as const] : [];
  });
  const query = identityQuery.parse({ ...Object.fromEntries(texts), limit: pageLength });
  const seen = typeof given.seen === 'string' && /^\d{1,6}$/.test(given.seen) ? Number(given.seen) : 0;
  return { query, before: query.cursor === undefined ? 0 : seen };
}
