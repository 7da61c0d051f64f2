import { toInt, type Int } from '../arith/int';
import type { Element } from '../expression/element';
import { angle, negate, product, sum, symbol, type Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import type { GradedRing } from './graded-ring';
import { etaFactors, multiple } from './write-word';

/** An expression with the number of its symbols, forms and integers. */
export interface Sized {
  readonly expression: Expression;
  readonly size: number;
}

/** Larger expressions are not written. */
const SIZE_LIMIT = 1_000;

/**
 * Words as they stand: sums and products are put together and nothing is simplified, so that what is too long to be written out in
 * words can be shown. An expression may be that of 0. Refused (`size`) past a thousand symbols.
 */
export function expressionRing<A>(write: (entry: A) => Element): GradedRing<A, Sized> {
  const sized = (expression: Expression, size: number): Sized => {
    if (size > SIZE_LIMIT) throw new Refusal('size', 'A class has too many words to be written. Use smaller words.');
    return { expression, size };
  };
  const integer = (n: Int): Sized | undefined => (n === 0 ? undefined : sized(multiple(BigInt(n), []), 1));
  return {
    integer: (n) => integer(toInt(BigInt(n))),
    symbol(entry) {
      const element = write(entry);
      return isUnity(element) ? undefined : sized(symbol([element]), 1);
    },
    angle(entry) {
      const element = write(entry);
      return isUnity(element) ? integer(1) : sized(angle([element]), 1);
    },
    eta: (power) => sized(etaWord(power), 1),
    add: (_degree, x, y) => sized(sum([...summands(x.expression), ...summands(y.expression)]), x.size + y.size),
    negate: (_degree, x) => sized(negate(x.expression), x.size),
    multiply(_m, x, _n, y) {
      if (isOne(x.expression)) return y;
      if (isOne(y.expression)) return x;
      return sized(product([...factors(x.expression), ...factors(y.expression)]), x.size + y.size);
    },
    equal: (_degree, x, y) => x.expression === y.expression,
  };
}

const isUnity = (e: Element): boolean => e.kind === 'integer' && e.value === 1n;
const isOne = (e: Expression): boolean => e.kind === 'integer' && e.value === 1n;
const summands = (e: Expression): readonly Expression[] => (e.kind === 'sum' ? e.terms : [e]);
const factors = (e: Expression): readonly Expression[] => (e.kind === 'product' ? e.factors : [e]);

function etaWord(power: number): Expression {
  const [only, more] = etaFactors(power);
  return only !== undefined && more === undefined ? only : product(etaFactors(power));
}
