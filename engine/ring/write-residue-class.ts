import type { Element } from '../expression/element';
import { angle, symbol, type Expression } from '../expression/expression';
import type { FiniteField } from '../field/field';
import { orderModFour } from './field-units';
import type { ResidueClass } from './residue-class-ring';
import { residueWords } from './residue-words';
import { etaFactors, multiple, total, zeroExpression } from './write-word';

/** What writing needs to know of a finite field. */
export type WrittenField<E> = Pick<FiniteField<E>, 'name' | 'order' | 'characteristic' | 'write' | 'nonSquare'>;

/** The canonical form of a class of K^MW_m(𝔽_q), with `prefix` in front of every word. */
export function writeResidueClass<E>(
  field: WrittenField<E>,
  degree: number,
  value: ResidueClass<E> | undefined,
  prefix: readonly Expression[] = [],
): Expression {
  if (value === undefined) return zeroExpression;
  const write = (unit: E): Element => field.write(unit);
  return total(
    residueWords(degree, value, { nonSquare: field.nonSquare, orderModFour: orderModFour(field) }).map((word) =>
      multiple(word.coefficient, [
        ...etaFactors(word.eta),
        ...prefix,
        ...(word.symbol === undefined ? [] : [symbol([write(word.symbol)])]),
        ...(word.angle === undefined ? [] : [angle([write(word.angle)])]),
      ]),
    ),
  );
}
