import type { Element } from '../expression/element';
import { Refusal } from '../expression/refusal';
import type { Span } from '../expression/span';
import {
  constantFunction,
  isZeroFunction,
  multiplyFunctions,
  negateFunction,
  powerFunction,
  sumFunctions,
  type LetterFunction,
} from './letter-function';
import type { LetterRing } from './multivariate';
import { rational, rationals } from './rational';

/**
 * The value of a written element as a function in letters; `letterValue` gives what a letter stands for. Products, quotients and
 * powers are not multiplied out; sums are. Refuses division by zero, and what passes a limit on size.
 */
export function readLetterFunction(
  element: Element,
  ring: LetterRing,
  letterValue: (name: string) => LetterFunction,
): LetterFunction {
  const read = (e: Element): LetterFunction => {
    ring.budget.spend('reading an entry');
    switch (e.kind) {
      case 'integer':
        return constantFunction(ring, rational(e.value));
      case 'letter':
        return letterValue(e.name);
      case 'negate':
        return negateFunction(ring, read(e.of));
      case 'sum':
        return sumFunctions(ring, e.terms.map(read));
      case 'product':
        return product(e.factors);
      case 'quotient':
        return multiplyFunctions(ring, read(e.numerator), inverse(e.denominator, e.denominator.at ?? e.at));
      case 'power':
        return e.exponent < 0
          ? powerFunction(ring, inverse(e.base, e.base.at ?? e.at), BigInt(-e.exponent), e.at)
          : powerFunction(ring, read(e.base), BigInt(e.exponent), e.at);
    }
  };
  /** Halves against halves, so that long products meet few long constants. */
  const product = (factors: readonly Element[]): LetterFunction => {
    const [only] = factors;
    if (only === undefined) return constantFunction(ring, rationals.one);
    if (factors.length === 1) return read(only);
    const middle = factors.length >> 1;
    return multiplyFunctions(ring, product(factors.slice(0, middle)), product(factors.slice(middle)));
  };
  const inverse = (e: Element, at: Span | undefined): LetterFunction => {
    const value = read(e);
    if (isZeroFunction(value)) throw new Refusal('division-by-zero', 'The denominator is 0. Change it to a unit.', at);
    return powerFunction(ring, value, -1n, at);
  };
  return read(element);
}
