import type { Route } from 'next';

/** Where an identity is, or one of its revisions. */
export const identityHref = (key: string, revision?: number): Route =>
  (revision === undefined ? `/identities/${key}` : `/identities/${key}/${revision}`) as Route;

export const reviseHref = (key: string): Route => `/identities/${key}/revise` as Route;
