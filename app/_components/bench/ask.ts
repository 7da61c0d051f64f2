import type { CompareAnswer, CompareRequest } from '@/lib/contracts/compare';
import type { NormalizeAnswer, NormalizeRequest } from '@/lib/contracts/normalize';
import type { Problem } from '@/lib/contracts/problem';
import type { ResiduesAnswer, ResiduesRequest } from '@/lib/contracts/residues';

/** What the bench asks: a verdict on a statement, or the canonical form of an expression. */
export interface Question {
  readonly kind: 'statement' | 'expression';
  readonly field: string;
  readonly text: string;
  /** Of an expression with hypotheses: itself without them, and each of them. */
  readonly under?: { readonly expression: string; readonly hypotheses: string[] };
}

/** An answer together with the question it belongs to. */
export type Answer =
  | { readonly kind: 'statement'; readonly question: Question; readonly body: CompareAnswer }
  | { readonly kind: 'expression'; readonly question: Question; readonly body: NormalizeAnswer };

/** What the answer to a question is kept under. */
export const answerKey = ({ kind, field, text }: Question) => ['answer', kind, field, text] as const;

export const sameQuestion = (a: Question | undefined, b: Question | undefined): boolean =>
  a === b || (a !== undefined && b !== undefined && a.kind === b.kind && a.field === b.field && a.text === b.text);

/** The service declined, or could not be reached (`problem` is absent). `message` is what a person is told. */
export class Declined extends Error {
  override readonly name = 'Declined';
  constructor(
    message: string,
    readonly problem?: Problem,
    /** Seconds after which one may ask again, where the service named them. */
    readonly again?: number,
  ) {
    super(message);
  }
}

function isProblem(value: unknown): value is Problem {
  return (
    typeof value === 'object' &&
    value !== null &&
    'detail' in value &&
    typeof value.detail === 'string' &&
    'code' in value
  );
}

const seconds = (count: number): string => (count === 1 ? '1 second' : `${count} seconds`);

async function declined(response: Response): Promise<Declined> {
  const body: unknown = await response.json().catch(() => undefined);
  const problem = isProblem(body) ? body : undefined;
  const wait = Number.parseInt(response.headers.get('Retry-After') ?? '', 10);
  const again = Number.isFinite(wait) && wait > 0 ? wait : undefined;
  if (response.status === 429)
    return new Declined(
      `Too many questions from this address. Ask again in ${seconds(again ?? 60)}.`,
      problem,
      again ?? 60,
    );
  return new Declined(
    problem?.detail ?? `The service answered with status ${response.status} and no reason. Ask again in a minute.`,
    problem,
    again,
  );
}

async function post<Body, Result>(path: string, body: Body, signal: AbortSignal): Promise<Result> {
  let response: Response;
  try {
    response = await fetch(path, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify(body),
      signal,
    });
  } catch (cause) {
    if (signal.aborted) throw cause;
    throw new Declined('No answer came: the connection is down. Your text is kept on this device.');
  }
  if (!response.ok) throw await declined(response);
  return (await response.json()) as Result;
}

export async function ask(question: Question, signal: AbortSignal): Promise<Answer> {
  const { field, text } = question;
  if (question.kind === 'statement') {
    const body = await post<CompareRequest, CompareAnswer>(
      '/api/v1/compare',
      { field, statement: text, forms: true },
      signal,
    );
    return { kind: 'statement', question, body };
  }
  const body = await post<NormalizeRequest, NormalizeAnswer>(
    '/api/v1/normalize',
    { field, ...(question.under ?? { expression: text }), steps: true },
    signal,
  );
  return { kind: 'expression', question, body };
}

/** The canonical form of an expression, without its derivation. */
export const askForm = (field: string, expression: string, signal: AbortSignal): Promise<NormalizeAnswer> =>
  post<NormalizeRequest, NormalizeAnswer>('/api/v1/normalize', { field, expression }, signal);

/** Every invariant of an expression: its comparison with zero. */
export const askInvariants = (field: string, expression: string, signal: AbortSignal): Promise<CompareAnswer> =>
  post<CompareRequest, CompareAnswer>('/api/v1/compare', { field, left: expression, right: '0' }, signal);

export const askResidues = (field: string, expression: string, signal: AbortSignal): Promise<ResiduesAnswer> =>
  post<ResiduesRequest, ResiduesAnswer>('/api/v1/residues', { field, expression }, signal);

/** The residue of a class at one place, against a uniformizer of one's own if one is named. */
export const askResidueAt = (
  { field, expression, place, uniformizer }: Record<'field' | 'expression' | 'place' | 'uniformizer', string>,
  signal: AbortSignal,
): Promise<ResiduesAnswer> =>
  post<ResiduesRequest, ResiduesAnswer>(
    '/api/v1/residues',
    { field, expression, places: [place], ...(uniformizer === '' ? {} : { uniformizer }) },
    signal,
  );

/** A verdict on two expressions. */
export const askSame = (field: string, left: string, right: string, signal: AbortSignal): Promise<CompareAnswer> =>
  post<CompareRequest, CompareAnswer>('/api/v1/compare', { field, left, right, forms: true }, signal);

/** Asks whether a field exists, by the smallest question over it; the answer names the field and its modulus. */
export const askField = (field: string, signal: AbortSignal): Promise<NormalizeAnswer> => askForm(field, '0', signal);
