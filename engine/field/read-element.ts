import { unlimited, type Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import { Refusal } from '../expression/refusal';
import type { Span } from '../expression/span';
import { elementText } from '../expression/to-text';
import { lettersOf } from './extension-field';
import type { Field } from './field';

/** The binary digits of 10^100000: elements of a field of characteristic 0 are refused past them. */
export const SIZE_LIMIT = 332193;

/**
 * The value of a written element in a field, in canonical form.
 *
 * Refuses with the stretch of text it is about: `unknown-letter`, `division-by-zero` (the denominator, or a power of 0 with
 * a negative exponent) and `size` (more than 10^5 digits; a power is measured before it is computed).
 */
export function readElement<E>(element: Element, field: Field<E>, budget: Budget = unlimited): E {
  return elementReader(field, budget)(element);
}

/** `readElement` for many elements of one field. */
export function elementReader<E>(field: Field<E>, budget: Budget): (element: Element) => E {
  const guarded = (value: E, at: Span | undefined): E => {
    if (field.size !== undefined && field.size(value) > SIZE_LIMIT) throw tooLarge(at);
    return value;
  };
  const inverted = (value: E, message: () => string, at: Span | undefined): E => {
    if (field.isZero(value)) throw new Refusal('division-by-zero', message(), at);
    return field.inverse(value);
  };
  /** Halves against halves, so that long sums of fractions meet few long denominators. */
  const folded = (parts: readonly Element[], join: (a: E, b: E) => E, at: Span | undefined): E => {
    budget.spend('reading an entry');
    if (parts.length === 1) return value(parts[0]!);
    const middle = parts.length >> 1;
    const [left, right] = [folded(parts.slice(0, middle), join, at), folded(parts.slice(middle), join, at)];
    try {
      return guarded(join(left, right), at);
    } catch (error) {
      // a field refuses what is too large without knowing where it is written
      if (error instanceof Refusal && error.code === 'size' && error.at === undefined && at !== undefined)
        throw new Refusal(error.code, error.message, at);
      throw error;
    }
  };
  const value = (e: Element): E => {
    switch (e.kind) {
      case 'integer':
        return guarded(field.fromInteger(e.value), e.at);
      case 'letter': {
        const letter = field.letter(e.name);
        if (letter === undefined) throw new Refusal('unknown-letter', unknownLetter(field, e.name), e.at);
        return letter;
      }
      case 'negate':
        return field.negate(value(e.of));
      case 'sum':
        return folded(e.terms, (a, b) => field.add(a, b), e.at);
      case 'product':
        return folded(e.factors, (a, b) => field.multiply(a, b), e.at);
      case 'quotient': {
        const below = e.denominator;
        const message = (): string => `The denominator ${vanishing(below)} in ${field.name}. Change it to a unit.`;
        const denominator = inverted(value(below), message, below.at ?? e.at);
        return guarded(field.multiply(value(e.numerator), denominator), e.at);
      }
      case 'power': {
        const base = value(e.base);
        const size = field.size?.(base) ?? 0;
        if (e.exponent !== 0 && (size - 1) * (e.exponent < 0 ? -e.exponent : e.exponent) > SIZE_LIMIT)
          throw tooLarge(e.at);
        if (e.exponent >= 0) return guarded(power(field, base, e.exponent, budget), e.at);
        const message = (): string =>
          `The base of a negative power ${vanishing(e.base)} in ${field.name}. Change it to a unit.`;
        return guarded(power(field, inverted(base, message, e.base.at ?? e.at), -e.exponent, budget), e.at);
      }
    }
  };
  return value;
}

/** The refusal of a number past the limit. */
export const tooLarge = (at: Span | undefined): Refusal =>
  new Refusal('size', 'This number has more than 100000 digits. Write it with smaller exponents.', at);

function unknownLetter(field: Field<unknown>, name: string): string {
  const letters = lettersOf(field);
  const missing = `${field.name} has no letter ${name}.`;
  if (letters.length > 0) return `${missing} Its elements are written with ${letters.join(' and ')}.`;
  return `${missing} Type a number, or choose a field with the letter ${name}, such as ${field.name}(${name}).`;
}

/** That an element is 0, in a message; it is named, cut short when it is long, unless it is written as 0. */
function vanishing(element: Element): string {
  const text = elementText(element);
  return text === '0' ? 'is 0' : `${text.length <= 60 ? text : `${text.slice(0, 57)}…`} is 0`;
}

function power<E>(field: Field<E>, base: E, exponent: number, budget: Budget): E {
  if (field.power !== undefined) return field.power(base, BigInt(exponent));
  let result = field.one;
  for (let bit = 31 - Math.clz32(exponent); bit >= 0; bit--) {
    budget.spend('reading an entry');
    result = field.multiply(result, result);
    if ((exponent >>> bit) & 1) result = field.multiply(result, base);
  }
  return result;
}
