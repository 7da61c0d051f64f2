import type { z } from 'zod';
import type { PermissionName } from './permission-name';
import type { ProblemCode } from './problem';

/** One worked exchange, shown in the documentation and held against the running service by a test. */
export interface Example {
  readonly name: string;
  readonly summary: string;
  /** Values of the path and of the query string, where the call has some. */
  readonly params?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string>>;
  readonly request?: unknown;
  readonly answer: unknown;
}

/**
 * One call of the API: the only source of its validation, its types, its documentation and its tests.
 *
 * @typeParam Request - the schema of the body; `undefined` for a call without one
 * @typeParam Answer - the schema of the body of a success
 * @typeParam Params - the schema of the parts of the path that stand in braces; each is a text
 * @typeParam Query - the schema of the query string; every value is a text, a key that is not in it is refused
 */
export interface Contract<
  Request extends z.ZodType | undefined,
  Answer extends z.ZodType,
  Params extends z.ZodObject | undefined = undefined,
  Query extends z.ZodObject | undefined = undefined,
> {
  readonly method: 'GET' | 'POST';
  readonly path: `/api/v1/${string}`;
  /** Name of the call in the OpenAPI document. */
  readonly operation: string;
  readonly summary: string;
  readonly description: string;
  readonly permission: PermissionName;
  readonly request: Request;
  readonly params?: Params;
  readonly query?: Query;
  readonly answer: Answer;
  /** The status of a success; 200 unless something is made. */
  readonly success?: 200 | 201;
  /** Whether the call takes an `Idempotency-Key`. */
  readonly idempotent?: boolean;
  /** Media types of a success besides JSON, each under the word that asks for it. */
  readonly files?: Readonly<Record<string, string>>;
  /** The problems particular to this call; those of every call (method, quota, …) are added by the document. */
  readonly problems: readonly ProblemCode[];
  readonly examples: readonly Example[];
}

export type AnyContract = Contract<z.ZodType | undefined, z.ZodType, z.ZodObject | undefined, z.ZodObject | undefined>;

/** Any problem that reading texts and naming a field can raise. */
export const readingProblems = [
  'invalid',
  'syntax',
  'field',
  'not-a-unit',
  'division-by-zero',
  'unknown-letter',
  'not-yet',
  'size',
  'budget',
  'busy',
] as const satisfies readonly ProblemCode[];
