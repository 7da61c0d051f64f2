import type { Node, Semantics } from 'ohm-js';
import type { Element } from '../engine/expression/element';
import type { Expression } from '../engine/expression/expression';
import type { Condition, Statement } from '../engine/expression/statement';
import { spanFrom, spanOf, undressed } from './nodes';

const readCondition = (node: Node): Condition => node.condition() as Condition;

/** The operations `condition` and `statement`. */
export function addStatementActions(semantics: Semantics): void {
  semantics.addOperation<Condition>('condition', {
    ...undressed('condition'),
    condition(node) {
      return readCondition(node);
    },
    condition_characteristic(left, relation, digits, _gap) {
      const is = relation.sourceString.startsWith('=');
      const at = spanFrom(spanOf(left), spanOf(digits));
      return { kind: 'characteristic', is, prime: BigInt(digits.sourceString), at };
    },
    condition_elements(leftNode, relation, rightNode) {
      const left = leftNode.element() as Element;
      const right = rightNode.element() as Element;
      const kind = relation.sourceString.startsWith('=') ? 'equal' : 'unequal';
      return { kind, left, right, at: spanFrom(left.at, right.at) };
    },
  });
  semantics.addOperation<readonly Condition[]>('conditions', {
    hypotheses(_semicolon, _gap, first, _commas, _gaps, rest) {
      return [first, ...rest.children].map(readCondition);
    },
  });
  semantics.addOperation<Statement>('statement', {
    ...undressed('statement'),
    statement(first, _equals, rest, hypotheses) {
      return {
        sides: [first, ...rest.children].map((side) => side.expression() as Expression),
        conditions: hypotheses.children.flatMap((node) => node.conditions() as readonly Condition[]),
      };
    },
  });
}
