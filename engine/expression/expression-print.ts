import type { Element } from './element';
import type { Expression } from './expression';

type Hold = 'atom' | 'power' | 'product' | 'negative' | 'sum';

interface Printed {
  readonly text: string;
  readonly hold: Hold;
}

/** The spellings in which text and TeX differ. */
export interface ExpressionStyle {
  readonly entry: (entry: Element) => string;
  readonly symbol: readonly [string, string];
  readonly angle: readonly [string, string];
  readonly pfister: readonly [string, string];
  readonly eta: string;
  readonly hyperbolic: string;
  readonly epsilon: string;
  readonly epsilonInteger: (count: bigint) => string;
  readonly power: (base: string, exponent: number) => string;
  readonly times: string;
  readonly wrap: (inner: string) => string;
  /** What must stand between two factors: a space between words, a sign before a digit, or nothing. */
  readonly between: (left: string, right: string) => string;
}

/** Prints a word in a style, so that reading what was printed gives the same tree. */
export const printExpression = (expression: Expression, style: ExpressionStyle): string =>
  print(expression, style).text;

function print(e: Expression, style: ExpressionStyle): Printed {
  const bracket = ([open, close]: readonly [string, string], entries: readonly Element[]): Printed => ({
    text: open + entries.map(style.entry).join(', ') + close,
    hold: 'atom',
  });
  switch (e.kind) {
    case 'integer':
      return e.value < 0n ? { text: `-${-e.value}`, hold: 'negative' } : { text: String(e.value), hold: 'atom' };
    case 'symbol':
      return bracket(style.symbol, e.entries);
    case 'angle':
      return bracket(style.angle, e.entries);
    case 'pfister':
      return bracket(style.pfister, e.entries);
    case 'eta':
      return { text: style.eta, hold: 'atom' };
    case 'hyperbolic':
      return { text: style.hyperbolic, hold: 'atom' };
    case 'epsilon':
      return { text: style.epsilon, hold: 'atom' };
    case 'epsilonInteger':
      return { text: style.epsilonInteger(e.count), hold: 'atom' };
    case 'negate':
      return { text: `-${within(print(e.of, style), ['negative', 'sum'], style)}`, hold: 'negative' };
    case 'power':
      return {
        text: style.power(within(print(e.base, style), ['power', 'product', 'negative', 'sum'], style), e.exponent),
        hold: 'power',
      };
    case 'sum':
      return printSum(e.terms, style);
    case 'product':
      return printProduct(e.factors, style);
  }
}

const within = (printed: Printed, weak: readonly Hold[], style: ExpressionStyle): string =>
  weak.includes(printed.hold) ? style.wrap(printed.text) : printed.text;

function printSum(terms: readonly Expression[], style: ExpressionStyle): Printed {
  const [first, ...rest] = terms;
  if (!first) return { text: '0', hold: 'atom' };
  const begun = print(first, style);
  if (rest.length === 0) return begun;
  const parts = [within(begun, ['sum'], style)];
  for (const term of rest) {
    const minus = term.kind === 'negate';
    parts.push(minus ? ' - ' : ' + ', within(print(minus ? term.of : term, style), ['negative', 'sum'], style));
  }
  return { text: parts.join(''), hold: 'sum' };
}

function printProduct(factors: readonly Expression[], style: ExpressionStyle): Printed {
  if (factors.length === 0) return { text: '1', hold: 'atom' };
  const printed = factors.map((factor) => print(factor, style));
  const [only] = printed;
  if (only && printed.length === 1) return only;
  const parts: string[] = [];
  for (const factor of printed) {
    const next = within(factor, ['product', 'negative', 'sum'], style);
    parts.push(parts.length > 0 ? style.between(parts.at(-1) ?? '', next) : '', next);
  }
  return { text: parts.join(''), hold: 'product' };
}
