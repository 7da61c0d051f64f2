import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';

/** Calls `visit` for the entries of symbols, angles and Pfister forms, as they stand. */
export function forEachElement(node: Expression, visit: (entry: Element) => void): void {
  switch (node.kind) {
    case 'symbol':
    case 'angle':
    case 'pfister':
      return node.entries.forEach(visit);
    case 'negate':
      return forEachElement(node.of, visit);
    case 'sum':
      return node.terms.forEach((term) => forEachElement(term, visit));
    case 'product':
      return node.factors.forEach((factor) => forEachElement(factor, visit));
    case 'power':
      return forEachElement(node.base, visit);
  }
}

/** Adds the letters of an element to a set. */
export function lettersOfElement(element: Element, names: Set<string>): void {
  switch (element.kind) {
    case 'letter':
      names.add(element.name);
      return;
    case 'negate':
      return lettersOfElement(element.of, names);
    case 'sum':
      return element.terms.forEach((term) => lettersOfElement(term, names));
    case 'product':
      return element.factors.forEach((factor) => lettersOfElement(factor, names));
    case 'quotient':
      lettersOfElement(element.numerator, names);
      return lettersOfElement(element.denominator, names);
    case 'power':
      return lettersOfElement(element.base, names);
  }
}
