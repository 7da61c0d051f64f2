import type { Span } from './span';

/** Why the engine does not answer. Every code is a fact about what was asked, never a defect of the program. */
export type RefusalCode =
  | 'not-a-unit' // an entry of a symbol is zero
  | 'division-by-zero' // inside an entry
  | 'unknown-letter' // the field does not have this letter
  | 'field' // no such field
  | 'not-yet' // a field or a question this version does not decide
  | 'hypothesis' // a condition that cannot be used
  | 'place' // no such place of the field
  | 'uniformizer' // not a uniformizer at the place
  | 'size' // past a limit on coefficients, degrees or exponents
  | 'budget'; // stopped at its time limit

/**
 * The engine's one error: it says what to change and, where it is known, which stretch of the text it is about.
 */
export class Refusal extends Error {
  override readonly name = 'Refusal';
  constructor(
    readonly code: RefusalCode,
    message: string,
    readonly at?: Span,
  ) {
    super(message);
  }
}
