import {
  integerElement,
  letterElement,
  negateElement,
  powerElement,
  productElement,
  sumElement,
  type Element,
} from '../expression/element';
import type { Field } from './field';
import type { Polynomial } from './polynomial';

/**
 * A polynomial as it is written: a sum from the highest power down, a coefficient in front of its power, coefficients 1 and
 * terms 0 left out. The constant term's own summands stand in the same sum: `y^2+z+1`, `(2*z+1)*y+2`, `2*z*y`. The sign of a
 * coefficient stands before its term: `t^2-t-1/2`.
 */
export function writePolynomial<E>(field: Field<E>, f: Polynomial<E>, letter: string): Element {
  const terms: Element[] = [];
  for (let i = f.length - 1; i >= 0; i--) {
    const c = f[i]!;
    if (field.isZero(c)) continue;
    const coefficient = field.write(c);
    if (i === 0) {
      terms.push(...(coefficient.kind === 'sum' ? coefficient.terms : [coefficient]));
      continue;
    }
    const negative = coefficient.kind === 'negate';
    const size = negative ? coefficient.of : coefficient;
    const power = i === 1 ? letterElement(letter) : powerElement(letterElement(letter), i);
    const isOne = size.kind === 'integer' && size.value === 1n;
    const term = isOne ? power : productElement([...(size.kind === 'product' ? size.factors : [size]), power]);
    terms.push(negative ? negateElement(term) : term);
  }
  return terms.length === 0 ? integerElement(0n) : terms.length === 1 ? terms[0]! : sumElement(terms);
}
