import { Fragment } from 'react';
import { Formula } from '../math/formula';

/** A sentence with mathematics in it: words, and TeX between them. */
export type Phrase = readonly (string | { readonly tex: string })[];

export const tex = (source: string): { readonly tex: string } => ({ tex: source });

export function Said({ phrase }: { readonly phrase: Phrase }) {
  return phrase.map((piece, index) => (
    <Fragment key={index}>{typeof piece === 'string' ? piece : <Formula tex={piece.tex} />}</Fragment>
  ));
}

/** Plain words in which K_2, F_7 and Q_5 are set as they are written by hand. */
export function withFormulas(words: string): Phrase {
  return words
    .split(/\b([KQF]_\w+)\b/)
    .map((part, index) =>
      index % 2 === 0 ? part : tex(`${part.startsWith('K') ? 'K' : `\\mathbb{${part.charAt(0)}}`}_{${part.slice(2)}}`),
    );
}

/** "2", "2 and 0", "2, 1 and 0". */
export function listed(items: readonly string[]): string {
  const head = items.slice(0, -1);
  const last = items.at(-1) ?? '';
  return head.length === 0 ? last : `${head.join(', ')} and ${last}`;
}
