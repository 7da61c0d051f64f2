import { StateField } from '@codemirror/state';
import { type Token, tokenize } from '@/grammar/tokens';

/** The pieces of the line, cut anew when it changes. */
export const lineTokens = StateField.define<readonly Token[]>({
  create: (state) => tokenize(state.doc.toString()),
  update: (tokens, transaction) => (transaction.docChanged ? tokenize(transaction.state.doc.toString()) : tokens),
});

/** The first token that ends at or after an offset, by bisection: tokens follow each other without gaps. */
export function tokenIndexAt(tokens: readonly Token[], offset: number): number {
  let low = 0;
  let high = tokens.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((tokens[middle]?.end ?? 0) < offset) low = middle + 1;
    else high = middle;
  }
  return low;
}
