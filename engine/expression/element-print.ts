import type { Element } from './element';

/** How strongly the printed form of an element holds together: what may stand around it without parentheses. */
type Hold = 'atom' | 'fraction' | 'power' | 'product' | 'quotient' | 'negative' | 'sum';

interface Printed {
  readonly text: string;
  readonly hold: Hold;
}

/** The spellings in which text and TeX differ. */
export interface ElementStyle {
  readonly letter: (name: string) => string;
  readonly power: (base: string, exponent: number) => string;
  /** A fraction with a bar, or null where quotients are written with a slash. */
  readonly quotient: ((numerator: string, denominator: string) => string) | null;
  readonly times: string;
  readonly wrap: (inner: string) => string;
}

/**
 * Prints an element in a style, so that reading what was printed gives the same tree.
 *
 * A product without a sign is used where it reads back as one: never before a digit, never right after a division.
 */
export function printElement(element: Element, style: ElementStyle): string {
  return print(element, style).text;
}

function print(e: Element, style: ElementStyle): Printed {
  switch (e.kind) {
    case 'integer':
      return e.value < 0n ? { text: `-${-e.value}`, hold: 'negative' } : { text: String(e.value), hold: 'atom' };
    case 'letter':
      return { text: style.letter(e.name), hold: 'atom' };
    case 'negate':
      return { text: `-${within(print(e.of, style), ['negative', 'sum'], style)}`, hold: 'negative' };
    case 'power':
      return {
        text: style.power(
          within(print(e.base, style), ['fraction', 'power', 'product', 'quotient', 'negative', 'sum'], style),
          e.exponent,
        ),
        hold: 'power',
      };
    case 'sum':
      return printSum(e.terms, style);
    case 'product':
      return printProduct(e.factors, style);
    case 'quotient':
      return printQuotient(e.numerator, e.denominator, style);
  }
}

const within = (printed: Printed, weak: readonly Hold[], style: ElementStyle): string =>
  weak.includes(printed.hold) ? style.wrap(printed.text) : printed.text;

function printSum(terms: readonly Element[], style: ElementStyle): Printed {
  const [first, ...rest] = terms;
  if (!first) return { text: '0', hold: 'atom' };
  const begun = print(first, style);
  if (rest.length === 0) return begun;
  let text = within(begun, ['sum'], style);
  for (const term of rest) {
    const minus = term.kind === 'negate';
    text += (minus ? '-' : '+') + within(print(minus ? term.of : term, style), ['negative', 'sum'], style);
  }
  return { text, hold: 'sum' };
}

function printProduct(factors: readonly Element[], style: ElementStyle): Printed {
  const [first, ...rest] = factors;
  if (!first) return { text: '1', hold: 'atom' };
  const begun = print(first, style);
  if (rest.length === 0) return begun;
  // A quotient may lead: a/b*c reads as (a/b)*c. After it a sign must stand.
  let text = within(begun, ['product', 'negative', 'sum'], style);
  let divided = begun.hold === 'quotient';
  for (const factor of rest) {
    const next = within(print(factor, style), ['product', 'quotient', 'negative', 'sum'], style);
    text += (divided || /^[0-9]/.test(next) ? style.times : '') + next;
    divided = false;
  }
  return { text, hold: 'product' };
}

function printQuotient(numerator: Element, denominator: Element, style: ElementStyle): Printed {
  const over = print(numerator, style);
  const under = print(denominator, style);
  if (style.quotient) return { text: style.quotient(over.text, under.text), hold: 'fraction' };
  const left = within(over, ['negative', 'sum'], style);
  return { text: `${left}/${within(under, ['product', 'quotient', 'negative', 'sum'], style)}`, hold: 'quotient' };
}
