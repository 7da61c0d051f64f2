import { z } from 'zod';

/** The slug of the group, a hyphen and the number of the identity: `skerry-6`. The last part of a slug is never a number. */
const shape = /^([a-z][a-z0-9]*(?:-[a-z0-9]*[a-z][a-z0-9]*)*)-([1-9][0-9]{0,8})$/;

export const identityKey = z
  .string()
  .max(120)
  .regex(shape)
  .describe('Key of an identity: the short name of its group and its number, such as `skerry-6`.');

/** The two parts of a key; undefined for a text that is none. */
export function partsOfKey(key: string): { readonly slug: string; readonly number: number } | undefined {
  const [, slug, number] = key.length <= 120 ? (shape.exec(key) ?? []) : [];
  return slug === undefined ? undefined : { slug, number: Number(number) };
}

export const keyOf = (slug: string, number: number): string => `${slug}-${number}`;
