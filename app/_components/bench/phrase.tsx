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

/** A name as plain words write it (K_2, K^MW_n, F_9, Q_5, n_ε), in TeX. */
function nameTex(name: string): string {
  const [base = '', index = ''] = name.split('_');
  const set = base === 'K^MW' ? 'K^{\\mathrm{MW}}' : /^[QF]$/.test(base) ? `\\mathbb{${base}}` : base;
  return `${set}_{${index === 'ε' ? '\\varepsilon' : index}}`;
}

/** Plain words with the names of groups and fields in them set as formulas. */
export function withFormulas(words: string): Phrase {
  return words
    .split(/(K\^MW_\w+|\b[KQF]_\w+|\bn_ε)/u)
    .map((part, index) => (index % 2 === 0 ? part : tex(nameTex(part))));
}

/** "2", "2 and 0", "2, 1 and 0". */
export function listed(items: readonly string[]): string {
  const head = items.slice(0, -1);
  const last = items.at(-1) ?? '';
  return head.length === 0 ? last : `${head.join(', ')} and ${last}`;
}
