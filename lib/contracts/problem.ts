import { z } from 'zod';

interface ProblemKind {
  readonly status: 400 | 401 | 403 | 404 | 405 | 409 | 413 | 415 | 422 | 429 | 500 | 503;
  readonly title: string;
  readonly about: string;
}

/**
 * Every way in which the service declines: code → status, title and what to do. The one table that the route wrapper, the
 * computation, the OpenAPI document and the help page read. `type` of a problem document is `/help#error-<code>`.
 */
export const problemKinds = {
  'unreadable-json': {
    status: 400,
    title: 'The body is not a JSON object',
    about: 'The body must be one JSON object in UTF-8.',
  },
  unauthenticated: {
    status: 401,
    title: 'A token is needed',
    about: 'Send `Authorization: Bearer` with a token that is neither expired nor revoked, or sign in.',
  },
  forbidden: { status: 403, title: 'Not permitted', about: 'The caller lacks the permission that this call needs.' },
  'not-found': { status: 404, title: 'Nothing is there', about: 'Nothing that the caller can see is at this address.' },
  conflict: {
    status: 409,
    title: 'It was changed meanwhile',
    about: 'The call began from an older revision; `current` has the newest. Begin again from that one.',
  },
  'idempotency-key': {
    status: 422,
    title: 'The key was used for another request',
    about: 'An `Idempotency-Key` belongs to one request: 1 to 200 printable characters, a new one for each.',
  },
  method: {
    status: 405,
    title: 'Another method is needed',
    about: 'The header `Allow` lists the methods that answer.',
  },
  'too-large': { status: 413, title: 'The body is too large', about: 'A body may have at most 1 MiB.' },
  'content-type': { status: 415, title: 'The body must be JSON', about: 'Send `Content-Type: application/json`.' },
  invalid: {
    status: 422,
    title: 'The request does not have the right shape',
    about: 'A key is missing, unknown or of the wrong type; `errors` names each.',
  },
  syntax: {
    status: 422,
    title: 'The text cannot be read',
    about: '`line`, `column`, `expected` and `excerpt` say where and what could stand there; `part` names the key.',
  },
  'not-a-unit': {
    status: 422,
    title: 'An entry of a symbol is zero',
    about: 'Every entry of a symbol must be a unit of the field.',
  },
  'division-by-zero': { status: 422, title: 'Division by zero', about: 'A denominator is zero in this field.' },
  'unknown-letter': {
    status: 422,
    title: 'The field does not have this letter',
    about: 'Name a field that has the letter, or `any`.',
  },
  field: { status: 422, title: 'There is no such field', about: 'The name of the field denotes no field.' },
  'not-yet': {
    status: 422,
    title: 'This version does not decide that',
    about: 'The question is understood and outside of what the engine decides.',
  },
  hypothesis: {
    status: 422,
    title: 'A hypothesis cannot be used',
    about: 'An equation must be solvable for a letter whose coefficient is a monomial up to sign.',
  },
  place: { status: 422, title: 'There is no such place', about: 'The field has no place of this name.' },
  uniformizer: {
    status: 422,
    title: 'Not a uniformizer',
    about: 'A uniformizer has valuation 1 at the place, and goes with exactly one place.',
  },
  'sides-differ': {
    status: 422,
    title: 'The sides are different',
    about: 'An identity is kept when its sides are equal. What is different can be kept with `warning: true`.',
  },
  'sides-agree': {
    status: 422,
    title: 'The sides are equal',
    about: 'With `warning: true` an identity says that its sides are different; these are equal.',
  },
  quota: {
    status: 429,
    title: 'Too many questions from this address',
    about: 'Ask again after the number of seconds in `Retry-After`.',
  },
  internal: {
    status: 500,
    title: 'The service failed',
    about: 'A defect of this service; the request id helps to find it.',
  },
  size: {
    status: 503,
    title: 'Stopped at a size limit',
    about: 'Coefficients past 100 000 digits or degrees past 10 000 are not computed.',
  },
  budget: {
    status: 503,
    title: 'Stopped at the time limit',
    about: 'The computation used up its time; `detail` says with what.',
  },
  busy: {
    status: 503,
    title: 'Too much is being computed',
    about: 'Ask again after the number of seconds in `Retry-After`.',
  },
  database: { status: 503, title: 'The database does not answer', about: 'Ask again later.' },
} as const satisfies Record<string, ProblemKind>;

export type ProblemCode = keyof typeof problemKinds;

const problemCodes = Object.keys(problemKinds) as [ProblemCode, ...ProblemCode[]];

/** The URI reference that names a kind of problem; the help page explains it there. */
export const problemType = (code: ProblemCode): string => `/help#error-${code}`;

/** A problem document (RFC 9457), the body of every answer that is not a success. */
export const problem = z.object({
  type: z.string().describe('Names the kind of problem: a link into the help page.'),
  title: z.string().describe('The kind of problem in a few words.'),
  status: z.int().min(400).max(599),
  detail: z.string().describe('What is wrong in this request, and what to change.'),
  code: z.enum(problemCodes).describe('The kind of problem in one word.'),
  part: z
    .string()
    .optional()
    .describe('The key of the request that the problem lies in, such as `left` or `places[1]`.'),
  line: z.int().min(1).optional().describe('Line in that text, from 1.'),
  column: z.int().min(1).optional().describe('Column in characters, from 1.'),
  current: z.unknown().optional().describe('For a conflict: what is there now.'),
  expected: z.array(z.string()).optional().describe('What could stand there.'),
  excerpt: z.string().optional().describe('The line, and under it a line with a caret at the column.'),
  errors: z
    .array(z.object({ key: z.string(), detail: z.string() }))
    .optional()
    .describe('For a request of the wrong shape: every key that is wrong.'),
});
export type Problem = z.infer<typeof problem>;

/** A problem document of the given kind. */
export const problemOf = (
  code: ProblemCode,
  detail: string,
  more: Omit<Partial<Problem>, 'code' | 'detail' | 'type' | 'title' | 'status'> = {},
): Problem => ({
  type: problemType(code),
  title: problemKinds[code].title,
  status: problemKinds[code].status,
  detail,
  code,
  ...more,
});
