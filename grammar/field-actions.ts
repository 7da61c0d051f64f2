import type { Node, Semantics } from 'ohm-js';
import type { Element } from '../engine/expression/element';
import type { FieldName } from '../engine/expression/field-name';
import { largeOrder } from './faults';
import { plainInteger, spanFrom, spanOf, textOf, undressed } from './nodes';

const read = (node: Node): FieldName => node.fieldName() as FieldName;

/** Exponents of 𝔽_{p^d} up to which the order is multiplied out. */
const largestOrderExponent = 1_000n;

const letterOf = (node: Node): string => {
  const element = node.element() as Element;
  return element.kind === 'letter' ? element.name : '';
};

/** The operations `fieldName`, `order` and `fieldStep`. */
export function addFieldActions(semantics: Semantics): void {
  semantics.addOperation<bigint>('order', {
    orderIndex(node) {
      return node.order() as bigint;
    },
    orderIndex_power(_underline, _gap, braced) {
      return braced.order() as bigint;
    },
    braced(_open, _gap, inner, _gap2, _close) {
      return inner.order() as bigint;
    },
    primePower(base, _gap, _hat, _gap2, exponent) {
      const power = BigInt(plainInteger(exponent.sourceString));
      if (power > largestOrderExponent) throw largeOrder(textOf(exponent), spanOf(exponent));
      return BigInt(base.sourceString) ** power;
    },
    primeIndex(node) {
      return BigInt(plainInteger(node.sourceString));
    },
  });
  semantics.addOperation<FieldName>('above(base)', {
    fieldStep(node) {
      return node.above(this.args.base) as FieldName;
    },
    fieldStep_functions(_open, _gap, letter, _gap2, close, _gap3) {
      const base = this.args.base as FieldName;
      return { kind: 'functions', base, letter: letterOf(letter), at: spanFrom(base.at, spanOf(close)) };
    },
    fieldStep_extension(_open, _g1, letter, _g2, _close, _g3, _over, _g4, _open2, _g5, modulus, close, _g6) {
      const base = this.args.base as FieldName;
      const at = spanFrom(base.at, spanOf(close));
      return { kind: 'extension', base, letter: letterOf(letter), modulus: modulus.element() as Element, at };
    },
  });
  semantics.addOperation<FieldName>('fieldName', {
    ...undressed('fieldName'),
    fieldName(base, _gap, steps) {
      return steps.children.reduce((field: FieldName, step) => step.above(field) as FieldName, read(base));
    },
    fieldBase(node) {
      return { ...read(node), at: spanOf(this) };
    },
    fieldBase_padics(_sign, _gap, index) {
      return { kind: 'padics', prime: index.order() as bigint };
    },
    fieldBase_finite(_sign, _gap, index) {
      return { kind: 'finite', order: index.order() as bigint };
    },
    fieldBase_rationals(_) {
      return { kind: 'rationals' };
    },
    fieldBase_reals(_) {
      return { kind: 'reals' };
    },
    fieldBase_complexes(_) {
      return { kind: 'complexes' };
    },
    fieldBase_any(_) {
      return { kind: 'any' };
    },
  });
}
