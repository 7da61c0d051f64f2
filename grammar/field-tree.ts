import type { FieldName } from '../engine/expression/field-name';
import { elementOf, letterOf } from './element-tree';
import { largeOrder } from './faults';
import type { SyntaxNode } from './syntax-node';
import { plainInteger, spanFrom } from './tree-parts';

/** Exponents d of 𝔽_{p^d} up to which the order is multiplied out. */
const largestDegree = 1_000n;

/** The name of a field that a node of the rule `fieldName` writes. */
export const fieldNameOf = (node: SyntaxNode): FieldName => node.each(2).reduce(stepOf, baseOf(node.child(0)));

function stepOf(base: FieldName, step: SyntaxNode): FieldName {
  const written = step.child(0);
  const letter = letterOf(written.child(2));
  if (written.rule === 'fieldStep_functions') {
    return { kind: 'functions', base, letter, at: spanFrom(base.at, written.child(4).at) };
  }
  return {
    kind: 'extension',
    base,
    letter,
    modulus: elementOf(written.child(10)),
    at: spanFrom(base.at, written.child(11).at),
  };
}

function baseOf(node: SyntaxNode): FieldName {
  const { at } = node;
  const written = node.child(0);
  switch (written.rule) {
    case 'fieldBase_padics':
      return { kind: 'padics', prime: BigInt(plainInteger(written.child(2).source)), at };
    case 'fieldBase_finite':
      return { kind: 'finite', order: orderOf(written.child(2)), at };
    case 'fieldBase_rationals':
      return { kind: 'rationals', at };
    case 'fieldBase_reals':
      return { kind: 'reals', at };
    case 'fieldBase_complexes':
      return { kind: 'complexes', at };
    default:
      return { kind: 'any', at };
  }
}

function orderOf(index: SyntaxNode): bigint {
  const written = index.child(0);
  if (written.rule !== 'orderIndex_power') return BigInt(plainInteger(written.source));
  const primePower = written.child(2).child(2);
  const exponent = primePower.child(4);
  const degree = BigInt(plainInteger(exponent.source));
  if (degree > largestDegree) throw largeOrder(index.text, exponent.at);
  return BigInt(primePower.child(0).source) ** degree;
}
