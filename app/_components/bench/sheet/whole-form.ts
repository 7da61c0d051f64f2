import type { NormalizedPart } from '@/lib/contracts/normalize';
import type { Typeset } from '@/lib/contracts/typeset';

function summed(terms: readonly string[]): string {
  return terms.reduce((sum, term) =>
    term.startsWith('-') ? `${sum} - ${term.slice(1).trimStart()}` : `${sum} + ${term}`,
  );
}

/** The canonical form of a whole class: its parts by degree, summed as they are read back. */
export function wholeForm(parts: readonly Pick<NormalizedPart, 'normalForm'>[]): Typeset {
  if (parts.length === 0) return { text: '0', tex: '0' };
  return {
    text: summed(parts.map((part) => part.normalForm.text)),
    tex: summed(parts.map((part) => part.normalForm.tex)),
  };
}
