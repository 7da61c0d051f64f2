import type { Statement } from '@/engine/expression/statement';
import { statementTex } from '@/engine/expression/to-tex';
import { readStatement } from '@/grammar/read';
import { ReadingError } from '@/grammar/reading-error';

/** What the written line says, as far as it can be read here, without a field. */
export type Reading =
  | { readonly state: 'empty'; readonly text: string }
  | {
      readonly state: 'read';
      readonly text: string;
      readonly kind: 'statement' | 'expression';
      readonly tex: string;
      readonly statement: Statement;
    }
  | { readonly state: 'unread'; readonly text: string; readonly error: ReadingError };

/** Past this many characters a line is read when the hand rests, not at each key. */
export const longLine = 1500;

export function readLine(text: string): Reading {
  if (text.trim() === '') return { state: 'empty', text };
  try {
    const statement = readStatement(text);
    return {
      state: 'read',
      text,
      kind: statement.sides.length > 1 ? 'statement' : 'expression',
      tex: statementTex(statement),
      statement,
    };
  } catch (error) {
    if (error instanceof ReadingError) return { state: 'unread', text, error };
    throw error;
  }
}
