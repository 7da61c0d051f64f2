import type { Route } from 'next';

/** The address that opens a statement or an expression on the bench, over a field. */
export const benchAddress = (field: string, statement: string): Route =>
  `/bench?${new URLSearchParams({ field, statement }).toString()}` as Route;
