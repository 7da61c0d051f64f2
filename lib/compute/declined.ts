import { Refusal, type RefusalCode } from '@/engine/expression/refusal';
import type { ReadingError } from '@/grammar/reading-error';
import { type Problem, type ProblemCode, problemOf } from '@/lib/contracts/problem';
import { locate } from './locate';
import { type Source, sourceOf } from './source';

/** Thrown inside a computation to end it with a problem document. */
export class Declined extends Error {
  override readonly name = 'Declined';
  constructor(readonly problem: Problem) {
    super(problem.detail);
  }
}

/** The engine's codes and the problems they become. A new code does not compile until it has its line here. */
const problemOfRefusal: Record<RefusalCode, ProblemCode> = {
  'not-a-unit': 'not-a-unit',
  'division-by-zero': 'division-by-zero',
  'unknown-letter': 'unknown-letter',
  field: 'field',
  'not-yet': 'not-yet',
  hypothesis: 'hypothesis',
  place: 'place',
  uniformizer: 'uniformizer',
  size: 'size',
  budget: 'budget',
};

/** The problem document of a refusal, with its place in the text where that is known. */
export function refusalProblem(refusal: Refusal, sources: readonly Source[]): Problem {
  const code = problemOfRefusal[refusal.code];
  const source = refusal.at === undefined ? undefined : sourceOf(refusal.at, sources);
  if (refusal.at === undefined || source === undefined) return problemOf(code, refusal.message);
  return problemOf(code, refusal.message, { part: source.part, ...locate(source.text, refusal.at) });
}

/** The problem document of a text that cannot be read. */
export function syntaxProblem(error: ReadingError, part: string): Problem {
  return problemOf('syntax', error.detail, {
    part,
    line: error.line,
    column: error.column,
    expected: error.expected.map((candidate) => candidate.text),
    excerpt: error.excerpt,
  });
}

/**
 * The problem document of whatever a computation threw. The runtime's own two limits, on the size of an integer and on the
 * depth of the stack, count as size limits. Undefined for anything else, which is a defect.
 */
export function problemOfError(error: unknown, sources: readonly Source[]): Problem | undefined {
  if (error instanceof Declined) return error.problem;
  if (error instanceof Refusal) return refusalProblem(error, sources);
  if (error instanceof RangeError && /BigInt|call stack/i.test(error.message))
    return problemOf('size', 'A number or a word in this computation grows past what can be held. Use smaller powers.');
  return undefined;
}
