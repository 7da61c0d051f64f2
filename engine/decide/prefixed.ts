import { integer, negate, product, type Expression } from '../expression/expression';
import { total } from '../ring/write-word';

/**
 * A sum of words in canonical form with a factor put into each, behind its coefficient and its η: 2η[3] with [t] becomes 2η[t][3]. The factor
 * comes before the symbols, which is where it belongs: η and integers are central.
 */
export function prefixed(prefix: Expression, form: Expression): Expression {
  switch (form.kind) {
    case 'sum':
      return total(form.terms.map((term) => prefixed(prefix, term)));
    case 'negate':
      return negate(prefixed(prefix, form.of));
    case 'integer':
      return form.value === 0n ? form : form.value === 1n ? prefix : product([integer(form.value), prefix]);
    case 'product': {
      const at = form.factors.findIndex((factor) => !isScalar(factor));
      const split = at < 0 ? form.factors.length : at;
      return product([...form.factors.slice(0, split), prefix, ...form.factors.slice(split)]);
    }
    default:
      return isScalar(form) ? product([form, prefix]) : product([prefix, form]);
  }
}

const isScalar = (factor: Expression): boolean =>
  factor.kind === 'integer' || factor.kind === 'eta' || (factor.kind === 'power' && factor.base.kind === 'eta');
