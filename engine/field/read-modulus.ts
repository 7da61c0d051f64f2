import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import { Refusal } from '../expression/refusal';
import type { Field } from './field';
import {
  addPolynomials,
  constant,
  degree,
  multiplyPolynomials,
  negatePolynomial,
  scalePolynomial,
  type Polynomial,
} from './polynomial';
import { readElement } from './read-element';

/** The largest degree of a modulus, and of every part of it. */
export const DEGREE_LIMIT = 200;

/**
 * A written modulus as a polynomial in the letter, coefficients in the field. Refuses what is no polynomial in it (`field`),
 * what has a degree past 200 (`size`), and what `readElement` refuses in the coefficients.
 */
export function readModulus<E>(modulus: Element, field: Field<E>, letter: string, budget: Budget): Polynomial<E> {
  const value = (e: Element): Polynomial<E> => {
    budget.spend('reading the modulus');
    if (!contains(e, letter)) return constant(field, readElement(e, field, budget));
    switch (e.kind) {
      case 'integer':
      case 'letter':
        return [field.zero, field.one];
      case 'negate':
        return negatePolynomial(field, value(e.of));
      case 'sum':
        return e.terms.map(value).reduce((f, g) => addPolynomials(field, f, g), []);
      case 'product':
        return e.factors.map(value).reduce((f, g) => product(f, g, e), [field.one]);
      case 'quotient': {
        if (contains(e.denominator, letter)) {
          throw notPolynomial(`it is divided by an expression in ${letter}`, e.denominator);
        }
        const denominator = readElement(e.denominator, field, budget);
        if (field.isZero(denominator)) {
          throw new Refusal(
            'division-by-zero',
            `The modulus is divided by 0 in ${field.name}.`,
            e.denominator.at ?? e.at,
          );
        }
        return scalePolynomial(field, field.inverse(denominator), value(e.numerator));
      }
      case 'power': {
        if (e.exponent < 0) throw notPolynomial(`${letter} has a negative exponent`, e);
        const base = value(e.base);
        if (degree(base) < 1) return constant(field, powerOf(base[0] ?? field.zero, e.exponent));
        if (degree(base) * e.exponent > DEGREE_LIMIT) throw tooHigh(e);
        let result: Polynomial<E> = [field.one];
        for (let i = 0; i < e.exponent; i++) result = product(result, base, e);
        return result;
      }
    }
  };
  const product = (f: Polynomial<E>, g: Polynomial<E>, of: Element): Polynomial<E> => {
    if (degree(f) + degree(g) > DEGREE_LIMIT) throw tooHigh(of);
    budget.spend('reading the modulus');
    return multiplyPolynomials(field, f, g);
  };
  const powerOf = (c: E, exponent: number): E => {
    let result = field.one;
    for (let bit = 31 - Math.clz32(exponent); bit >= 0; bit--) {
      result = field.multiply(result, result);
      if ((exponent >>> bit) & 1) result = field.multiply(result, c);
    }
    return result;
  };
  const notPolynomial = (why: string, where: Element): Refusal =>
    new Refusal('field', `The modulus must be a polynomial in ${letter}, and ${why}.`, where.at ?? modulus.at);
  const tooHigh = (where: Element): Refusal =>
    new Refusal(
      'size',
      `The modulus has a degree past ${DEGREE_LIMIT}. Type one of smaller degree.`,
      where.at ?? modulus.at,
    );
  return value(modulus);
}

function contains(e: Element, letter: string): boolean {
  switch (e.kind) {
    case 'integer':
      return false;
    case 'letter':
      return e.name === letter;
    case 'negate':
      return contains(e.of, letter);
    case 'sum':
      return e.terms.some((term) => contains(term, letter));
    case 'product':
      return e.factors.some((factor) => contains(factor, letter));
    case 'quotient':
      return contains(e.numerator, letter) || contains(e.denominator, letter);
    case 'power':
      return contains(e.base, letter);
  }
}
