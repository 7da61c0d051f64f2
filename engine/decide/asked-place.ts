import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import { Refusal } from '../expression/refusal';
import { shownElement } from '../expression/shown';
import { elementText } from '../expression/to-text';
import { factoredFunctions } from '../field/factored-function';
import type { FunctionField } from '../field/function-field';
import { degree, monic, type Polynomial } from '../field/polynomial';
import { elementReader } from '../field/read-element';
import { writePolynomial } from '../field/write-polynomial';
import type { Prime } from '../place/function-entry';

/** A place that was asked for: its text, and the same text read as an element of the field. */
export interface AskedPlace {
  readonly text: string;
  /** Throws what reading throws for a text that is no element. */
  readonly element: () => Element;
}

/** Whether a text names the place at infinity. */
export const isInfinity = (text: string): boolean => /^(infinity|infty|inf|oo|∞|\\infty)$/i.test(text.trim());

/**
 * The places of k(t) that were asked for, each once: infinity, or irreducible polynomials, which are made monic. Refuses (`place`) what
 * is no polynomial, constant or reducible, with the factor that was found.
 */
export function readFunctionPlaces<E>(
  functions: FunctionField<E>,
  asked: readonly AskedPlace[],
  factor: (f: Polynomial<E>) => readonly Prime<E>[],
  budget: Budget,
): readonly (Polynomial<E> | 'infinity')[] {
  const { base, generator } = functions;
  const written = factoredFunctions(functions);
  const read = elementReader(written, budget);
  const example = `Name an irreducible polynomial in ${generator}, such as ${generator}+1, or infinity.`;
  const places = new Map<string, Polynomial<E> | 'infinity'>();
  for (const { text, element } of asked) {
    if (isInfinity(text)) {
      places.set('infinity', 'infinity');
      continue;
    }
    const typed = element();
    const { num, den } = written.expand(read(typed));
    const refused = (why: string): Refusal =>
      new Refusal('place', `${shownElement(typed)} ${why}. ${example}`, typed.at);
    if (num.length === 0) throw refused('is 0, so it is no place');
    if (degree(den) > 0) throw refused(`is no polynomial, so it is no place of ${functions.name}`);
    if (degree(num) === 0) throw refused(`is a constant, so it is no place of ${functions.name}`);
    const place = monic(base, num);
    const [first, second] = factor(place);
    if (first !== undefined && (second !== undefined || first.exponent > 1)) {
      const found = shownElement(writePolynomial(base, first.factor, generator));
      throw refused(`is reducible: ${found} divides it`);
    }
    places.set(elementText(writePolynomial(base, place, generator)), place);
  }
  return [...places.values()];
}

/** The uniformizer that was typed goes with exactly one place. */
export function checkOnePlace(count: number | undefined, uniformizer: Element): void {
  if (count !== 1)
    throw new Refusal(
      'uniformizer',
      'A uniformizer goes with exactly one place. Name that place in places.',
      uniformizer.at,
    );
}

/** The refusal of a typed element with another valuation than 1. */
export function noUniformizer(element: Element, valuation: string, place: string, example: string): Refusal {
  return new Refusal(
    'uniformizer',
    `${shownElement(element)} has valuation ${valuation} at ${place}, so it is no uniformizer there. Take ${example} times a unit at ${place}.`,
    element.at,
  );
}
