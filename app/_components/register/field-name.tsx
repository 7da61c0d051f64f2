import type { Typeset } from '@/lib/contracts/typeset';
import { Formula } from '../math/formula';

/** The field an identity is over, as a cell of the ledger shows it. */
export function FieldName({ field }: { readonly field: Typeset }) {
  return field.text === 'any' ? <span className="it">any field</span> : <Formula tex={field.tex} />;
}
