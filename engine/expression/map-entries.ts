import type { Element } from './element';
import type { Expression } from './expression';

/** The same expression with every entry of a symbol, an angle or a Pfister form replaced. */
export function mapEntries(expression: Expression, f: (entry: Element) => Element): Expression {
  switch (expression.kind) {
    case 'symbol':
    case 'angle':
    case 'pfister':
      return { ...expression, entries: expression.entries.map(f) };
    case 'negate':
      return { ...expression, of: mapEntries(expression.of, f) };
    case 'sum':
      return { ...expression, terms: expression.terms.map((term) => mapEntries(term, f)) };
    case 'product':
      return { ...expression, factors: expression.factors.map((factor) => mapEntries(factor, f)) };
    case 'power':
      return { ...expression, base: mapEntries(expression.base, f) };
    default:
      return expression;
  }
}
