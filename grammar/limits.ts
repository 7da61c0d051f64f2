import type { Span } from '../engine/expression/span';
import { ReadingError } from './reading-error';

/** Characters of an expression, a field element, a condition or a name of a field. */
export const longestExpression = 20_000;
/** Characters of a statement; each of its sides is an expression. */
export const longestStatement = 100_000;
/** Brackets inside brackets; a division a/b/c counts as one more, because it nests to the left. */
export const deepestNesting = 200;
/** The exponent of a power of a word. */
export const largestPower = 64;
/** The size of an exponent inside an entry. */
export const largestEntryExponent = 10_000;

const figure = (n: number): string => String(n).replace(/(\d)(?=(\d{3})+$)/g, '$1 ');

/** More characters than `limit`, counted by code points; the UTF-16 length bounds their number from above. */
const isLonger = (text: string, limit: number): boolean => text.length > limit && [...text].length > limit;

const tooLong = (text: string, what: string, limit: number, at: Span): ReadingError =>
  new ReadingError(text, {
    detail: `${what} has at most ${figure(limit)} characters, and this one has ${figure([...text.slice(at.start, at.end)].length)}.`,
    offset: at.start,
    offending: '',
    expected: [{ text: 'a shorter text, or several' }],
  });

/** Refuses a text that is too long or nests too deeply, before it is read. */
export function checkSize(text: string, kind: 'expression' | 'statement'): void {
  if (kind === 'expression') {
    if (isLonger(text, longestExpression)) {
      throw tooLong(text, 'An expression', longestExpression, { start: 0, end: text.length });
    }
  } else {
    if (isLonger(text, longestStatement)) {
      throw tooLong(text, 'A statement', longestStatement, { start: 0, end: text.length });
    }
    if (text.length > longestExpression) checkSides(text);
  }
  checkNesting(text);
}

function checkSides(text: string): void {
  let start = 0;
  for (let end = 0; end <= text.length; end++) {
    if (end < text.length && text[end] !== '=' && text[end] !== ';') continue;
    if (isLonger(text.slice(start, end), longestExpression)) {
      throw tooLong(text, 'A side of a statement', longestExpression, { start, end });
    }
    start = end + 1;
  }
}

const openers = new Set(['(', '[', '{', '<', '⟨', '⟪', '\u2329', '\u3008', '《']);
const closers = new Set([')', ']', '}', '>', '⟩', '⟫', '\u232A', '\u3009', '》']);
/** Signs after which a chain of divisions begins anew. */
const chainBreaks = new Set(['+', '-', '−', ',', '=', ';']);

function checkNesting(text: string): void {
  // One number a level: how often / stands in the running product there.
  const divisions: number[] = [0];
  let depth = 0;
  for (let i = 0; i < text.length; i++) {
    const c = text.charAt(i);
    if (openers.has(c)) {
      divisions.push(0);
      depth++;
    } else if (closers.has(c)) {
      if (divisions.length > 1) depth -= 1 + (divisions.pop() ?? 0);
    } else if (c === '/' || c === '∕' || c === '⁄') {
      divisions[divisions.length - 1] = (divisions.at(-1) ?? 0) + 1;
      depth++;
    } else if (chainBreaks.has(c)) {
      depth -= divisions.at(-1) ?? 0;
      divisions[divisions.length - 1] = 0;
    } else continue;
    if (depth > deepestNesting) {
      throw new ReadingError(text, {
        detail: `Brackets and divisions nest at most ${deepestNesting} deep, and here they go deeper.`,
        offset: i,
        offending: c,
        expected: [{ text: 'a flatter expression' }],
      });
    }
  }
}

/** For a host whose call stack is too small for what the limits allow. */
export const tooDeepHere = (text: string): ReadingError =>
  new ReadingError(text, {
    detail: 'The brackets nest too deeply to be read here.',
    offset: 0,
    offending: '',
    expected: [{ text: 'a flatter expression' }],
  });
