import { integerElement, type Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import type { Condition } from '../expression/statement';
import { elementText } from '../expression/to-text';

/**
 * The conditions under which every entry of a statement is a unit: entry ≠ 0, products taken apart into their factors, each
 * once; then the conditions that were stated.
 */
export function sideConditionsOf(
  expressions: readonly Expression[],
  conditions: readonly Condition[],
): readonly Condition[] {
  const found = new Map<string, Element>();
  const note = (entry: Element): void => {
    switch (entry.kind) {
      case 'negate':
        return note(entry.of);
      case 'product':
        return entry.factors.forEach(note);
      case 'quotient':
        note(entry.numerator);
        return note(entry.denominator);
      case 'power':
        return entry.exponent === 0 ? undefined : note(entry.base);
      case 'integer':
        if (entry.value === 1n) return;
    }
    found.set(elementText(entry), entry);
  };
  const walk = (node: Expression): void => {
    switch (node.kind) {
      case 'symbol':
      case 'angle':
      case 'pfister':
        return node.entries.forEach(note);
      case 'negate':
        return walk(node.of);
      case 'sum':
        return node.terms.forEach(walk);
      case 'product':
        return node.factors.forEach(walk);
      case 'power':
        return walk(node.base);
    }
  };
  expressions.forEach(walk);
  const units = [...found.values()].map((left): Condition => ({ kind: 'unequal', left, right: integerElement(0n) }));
  const own = new Set(found.keys());
  const stated = conditions.filter(
    (condition) =>
      condition.kind !== 'unequal' || elementText(condition.right) !== '0' || !own.has(elementText(condition.left)),
  );
  return [...units, ...stated];
}
