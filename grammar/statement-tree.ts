import type { Condition, Statement } from '../engine/expression/statement';
import { elementOf } from './element-tree';
import { expressionOf } from './expression-tree';
import type { SyntaxNode } from './syntax-node';
import { spanFrom } from './tree-parts';

/** The statement that a node of the rule `statement` writes. */
export function statementOf(node: SyntaxNode): Statement {
  const hypotheses = node.option(3);
  return {
    sides: [node.child(0), ...node.each(2)].map(expressionOf),
    // A semicolon, a gap, the first condition, then the columns of commas, gaps and further conditions.
    conditions: hypotheses ? [hypotheses.child(2), ...hypotheses.each(5)].map(conditionOf) : [],
  };
}

/** The hypothesis that a node of the rule `condition` writes. */
export function conditionOf(node: SyntaxNode): Condition {
  const written = node.child(0);
  const equal = written.child(1).source.startsWith('=');
  if (written.rule === 'condition_characteristic') {
    const prime = written.child(2);
    const at = { start: written.start, end: prime.end };
    return { kind: 'characteristic', is: equal, prime: BigInt(prime.source), at };
  }
  const left = elementOf(written.child(0));
  const right = elementOf(written.child(2));
  return { kind: equal ? 'equal' : 'unequal', left, right, at: spanFrom(left.at, right.at) };
}
