import type { Element } from './element';

/** An element with letters replaced by elements; letters without a value stay. */
export function substituteLetters(element: Element, values: ReadonlyMap<string, Element>): Element {
  const inside = (e: Element): Element => {
    switch (e.kind) {
      case 'integer':
        return e;
      case 'letter':
        return values.get(e.name) ?? e;
      case 'negate':
        return { ...e, of: inside(e.of) };
      case 'sum':
        return { ...e, terms: e.terms.map(inside) };
      case 'product':
        return { ...e, factors: e.factors.map(inside) };
      case 'quotient':
        return { ...e, numerator: inside(e.numerator), denominator: inside(e.denominator) };
      case 'power':
        return { ...e, base: inside(e.base) };
    }
  };
  return inside(element);
}
