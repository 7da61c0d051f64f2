import { z } from 'zod';
import type { Sort } from '@/lib/contracts/identity-query';

/** Where a page ended: what its last row is sorted by. */
export interface Place {
  readonly number: number;
  /** The moment of the last change with all its digits, the name or the state, where these are sorted by. */
  readonly changed?: string;
  readonly name?: string;
  readonly state?: string;
}

// No year 0: JavaScript has one, PostgreSQL does not.
const moment = z.string().regex(/^(?!0000)\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{6}Z$/);
const number = z.int().min(1).max(2_147_483_647);
const text = z
  .string()
  .max(400)
  .refine((given) => !/[\0\p{Cs}]/u.test(given));

const shapes = {
  changed: z.strictObject({ number, changed: moment }),
  name: z.strictObject({ number, name: text }),
  number: z.strictObject({ number }),
  state: z.strictObject({ number, changed: moment, state: text }),
} as const;

export const sortKey = (sort: Sort): keyof typeof shapes => sort.replace('-', '') as keyof typeof shapes;

/** A cursor is a place and the order it belongs to. It grants nothing: the rows after it are looked up like any others. */
export const writeCursor = (sort: Sort, place: Place): string =>
  Buffer.from(JSON.stringify([sort, place])).toString('base64url');

/** The place of a cursor; undefined for a text that is none, or is one of another order. */
export function readCursor(cursor: string, sort: Sort): Place | undefined {
  try {
    const whole: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    const read = z.tuple([z.literal(sort), shapes[sortKey(sort)]]).safeParse(whole);
    return read.success && isMoment(read.data[1]) ? read.data[1] : undefined;
  } catch {
    return undefined;
  }
}

/** The thirtieth of February has the shape of a day and is none. */
const isMoment = (place: Place): boolean =>
  place.changed === undefined || new Date(place.changed).toISOString().slice(0, 19) === place.changed.slice(0, 19);
