import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { minusOneElement } from '../ring/write-word';

/**
 * The canonical form over 𝔽_p of a class without letters, as it stands in characteristic p among words with letters: −1 is written
 * as −1, and for p ≡ 3 mod 4 it serves as the non-square of discriminants. So a class made of −1 and η reads back beside letters.
 */
export function constantForm(form: Expression, p: bigint): Expression {
  const sign = (entry: Element): Element =>
    entry.kind === 'integer' && entry.value === p - 1n ? minusOneElement : entry;
  switch (form.kind) {
    case 'symbol':
      return p === 2n ? form : { ...form, entries: form.entries.map(sign) };
    case 'angle':
      return p % 4n === 3n ? { ...form, entries: form.entries.map(() => minusOneElement) } : form;
    case 'negate':
      return { ...form, of: constantForm(form.of, p) };
    case 'sum':
      return { ...form, terms: form.terms.map((term) => constantForm(term, p)) };
    case 'product':
      return { ...form, factors: form.factors.map((factor) => constantForm(factor, p)) };
    default:
      return form;
  }
}
