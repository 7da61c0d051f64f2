import { openText, operand, spell } from './expected';
import type { Finding, Situation } from './situation';
import type { Token } from './tokens';

const entryBrackets = new Set(['symbol', 'angle', 'pfister']);

/** What is missing after an operator, an opening bracket, a comma, or at the beginning. */
export function missingOperand(situation: Situation): Finding {
  const { before, where, inEntry } = situation;
  const [last, earlier] = before;
  const expected = operand(situation);
  if (!last || last.kind === 'dressing')
    return { detail: `A text cannot begin with ${spell(situation, situation.here)}.`, expected };
  if (beginsExponent(before) || (last.kind === 'sign' && beginsExponent(before.slice(1))))
    return missingExponent(situation);
  if (last.kind === 'underline' || (last.kind === 'open' && earlier?.kind === 'underline'))
    return missingIndex(situation);
  const sign = spell(situation, last);
  switch (last.kind) {
    case 'open':
      if (last.bracket !== undefined && entryBrackets.has(last.bracket)) {
        return {
          detail: `The bracket ${openText(situation, last)} has no entry ${where}.`,
          expected,
          open: openSpan(situation),
        };
      }
      return {
        detail: `Nothing stands in the bracket ${openText(situation, last)} ${where}.`,
        expected,
        open: openSpan(situation),
      };
    case 'comma':
      return inEntry && situation.open.length === 0
        ? { detail: `After the comma a hypothesis is missing ${where}.`, expected }
        : { detail: `After the comma an entry is missing ${where}.`, expected, open: openSpan(situation) };
    case 'semicolon':
      return {
        detail: `After the semicolon a hypothesis is missing ${where}.`,
        expected: [{ text: 'a hypothesis such as `a != 1` or `char != 2`' }],
      };
    case 'equals':
    case 'unequal':
      if (earlier?.kind === 'word' && inEntry) {
        return {
          detail: `After ${spell(situation, earlier)} ${sign} a prime is missing ${where}.`,
          expected: [{ text: 'a prime such as `2`' }],
        };
      }
      return { detail: `After ${sign} a side is missing ${where}.`, expected };
    case 'times':
      return { detail: `After ${sign} a factor is missing ${where}.`, expected };
    case 'over':
      return { detail: `After ${sign} a divisor is missing ${where}.`, expected };
    default:
      return { detail: `After ${sign} a term is missing ${where}.`, expected };
  }
}

/** A hat, or the bracket right after one, is the last token. */
const beginsExponent = ([last, earlier]: readonly Token[]): boolean =>
  last?.kind === 'hat' || (last?.kind === 'open' && earlier?.kind === 'hat');

function openSpan(situation: Situation): Finding['open'] {
  const innermost = situation.open.at(-1);
  return innermost && { start: innermost.start, end: situation.offset };
}

function missingExponent(situation: Situation): Finding {
  const { here, inEntry } = situation;
  const expected = [{ text: inEntry ? 'an integer such as `2` or `-1`' : 'an integer such as `2`' }];
  const operandLike = here && ['letter', 'word', 'open', 'fraction', 'number'].includes(here.kind);
  if (operandLike) return { detail: `An exponent is an integer, and ${spell(situation, here)} is none.`, expected };
  return { detail: `After ^ an exponent is missing ${situation.where}.`, expected };
}

function missingIndex(situation: Situation): Finding {
  if (situation.inEntry) {
    return {
      detail: `The index of a letter is a number, as in x_1, and it is missing ${situation.where}.`,
      expected: [{ text: 'a number such as `1`' }],
    };
  }
  return {
    detail: 'After the index sign of a number stands eps only, as in 3_eps.',
    expected: [{ text: '`eps`', insert: 'eps' }],
  };
}
