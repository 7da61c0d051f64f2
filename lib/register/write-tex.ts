import type { IdentitySummary } from '@/lib/contracts/identity-answer';
import { texText } from './escape-tex';

/** An identity as a paragraph of TeX, with amsmath and amssymb. */
export function identityTex(identity: IdentitySummary): string {
  const { key, revision, name, hypotheses, state, warning, withdrawnReason } = identity;
  const conditions = hypotheses.map(({ tex }) => `$${tex}$`).join(', ');
  const lines = [
    `% ${key}, revision ${revision}, ${state}`,
    `\\paragraph{${texText(name)}.} (${texText(key)}) ${over(identity)}${conditions === '' ? '' : `, with ${conditions}`}${
      warning ? ', the following does \\emph{not} hold' : ''
    }:`,
    '\\begin{equation*}',
    `  ${formulaOf(identity)}`,
    '\\end{equation*}',
    ...(withdrawnReason === undefined ? [] : [`Withdrawn: ${texText(withdrawnReason)}`]),
    ...sourceOf(identity),
  ];
  return `${lines.join('\n')}\n`;
}

const over = ({ field }: IdentitySummary): string => (field.text === 'any' ? 'Over any field' : `Over $${field.tex}$`);

function formulaOf({ kind, statement, place, uniformizer, value }: IdentitySummary): string {
  if (kind === 'equality') return statement.tex;
  const at = [place?.tex, uniformizer?.tex].filter((tex) => tex !== undefined && tex !== '').join(';\\,');
  return `\\partial_{${at}}\\left(${statement.tex}\\right) = ${value?.tex ?? ''}`;
}

function sourceOf({ reference, doi, arxiv }: IdentitySummary): string[] {
  const parts = [
    ...(reference === undefined ? [] : [texText(reference)]),
    ...(doi === undefined ? [] : [`DOI ${texText(doi)}`]),
    ...(arxiv === undefined ? [] : [`arXiv:${texText(arxiv)}`]),
  ];
  return parts.length === 0 ? [] : [`Reference: ${parts.join('; ')}`];
}
