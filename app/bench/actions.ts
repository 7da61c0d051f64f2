'use server';

import { saveLink } from '@/lib/links/links';

/** The longest statement that a line is meant to hold, in characters; each side may have 20 000. */
const longestStatement = 60_000;
const longestField = 500;

/** A server action can be called with anything: both texts are checked here, whatever the types say. */
const isText = (value: unknown, longest: number): value is string =>
  typeof value === 'string' && value.trim() !== '' && value.length <= longest;

/**
 * Keeps a statement under a code, so that a link can reopen it.
 *
 * @returns the path of the link, or undefined for what no bench can hold
 */
export async function makeLink(field: string, statement: string): Promise<string | undefined> {
  if (!isText(field, longestField) || !isText(statement, longestStatement)) return undefined;
  return `/bench/${await saveLink(field.trim(), statement.trim())}`;
}
