import { ReadingError } from './reading-error';

export type Reading = 'expression' | 'statement' | 'element' | 'condition' | 'field';

/** What to say about a text that the grammar does not read past `offset`. */
export function diagnose(text: string, offset: number, _reading: Reading): ReadingError {
  const offending = String.fromCodePoint(text.codePointAt(offset) ?? 32);
  const ends = offset >= text.trimEnd().length;
  return new ReadingError(text, {
    detail: ends ? 'The text ends too early.' : `${offending} cannot stand here.`,
    offset: ends ? text.trimEnd().length : offset,
    offending: ends ? '' : offending,
    expected: [],
  });
}
