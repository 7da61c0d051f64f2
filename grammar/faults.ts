import type { Span } from '../engine/expression/span';
import { largestEntryExponent, largestPower } from './limits';
import { type Expected, ReadingError } from './reading-error';

/** At most this many characters of the text are quoted in a sentence. */
const longestQuotation = 32;

/** A stretch of the text for use in a sentence: white space made single, the middle left out when it is long. */
export function quoted(text: string, at: Span): string {
  const words = [...text.slice(at.start, at.end).trim().replace(/\s+/g, ' ')];
  if (words.length <= longestQuotation) return words.join('');
  return `${words.slice(0, longestQuotation / 2).join('')}…${words.slice(-longestQuotation / 2).join('')}`;
}

const fault = (text: string, at: Span, detail: string, expected: readonly Expected[]): ReadingError =>
  new ReadingError(text, { detail, offset: at.start, offending: text.slice(at.start, at.end).trim(), expected });

/** `1/2t`: a product without a sign right after a division. `factors` runs over all factors that follow without a sign. */
export function ambiguousQuotient(text: string, numerator: Span, denominator: Span, factors: Span): ReadingError {
  const over = quoted(text, numerator);
  const under = quoted(text, denominator);
  const after = quoted(text, factors);
  const spaced = text.slice(denominator.end, factors.start).trim() === '' && denominator.end < factors.start ? ' ' : '';
  const first = `${over}/(${under}${spaced}${after})`;
  const second = `(${over}/${under})${after}`;
  return fault(
    text,
    factors,
    `${over}/${under}${spaced}${after} can be read in two ways: write ${first} or ${second}.`,
    [{ text: `\`${first}\`` }, { text: `\`${second}\`` }],
  );
}

/** `2^3^2`: exponents that are read in two ways. */
export function exponentTower(
  text: string,
  base: Span,
  exponents: readonly { at: Span; value: bigint }[],
  limit: number,
): ReadingError {
  const [first, second] = exponents;
  const b = quoted(text, base);
  const written = exponents.map((e) => `^${e.value < 0n ? `(${e.value})` : e.value}`);
  const choices = [`(${b}${written[0] ?? ''})${written[1] ?? ''}`];
  // The other reading is offered where its exponent can be written: a^e is at most the limit for e below its bit length.
  if (exponents.length === 2 && first && second && second.value >= 0n && second.value <= 64n) {
    const value = first.value ** second.value;
    if (value <= BigInt(limit) && value >= -BigInt(limit)) choices.push(`${b}^${value < 0n ? `(${value})` : value}`);
  }
  const at = second?.at ?? base;
  return fault(
    text,
    at,
    `${b}${written.join('')} is a tower of exponents, which can be read in two ways: write ${choices.join(' or ')}.`,
    choices.map((choice) => ({ text: `\`${choice}\`` })),
  );
}

/** A power of a word with an exponent that is negative. */
export const negativePower = (text: string, at: Span, value: bigint): ReadingError =>
  fault(text, at, `A power of an expression has an exponent 0 or more, and ${value} is negative.`, [
    { text: `a number from 0 to ${largestPower}` },
  ]);

/** A power of a word with an exponent above 64. */
export const largePower = (text: string, at: Span): ReadingError =>
  fault(text, at, `A power of an expression is at most ${largestPower}, and ${quoted(text, at)} is more.`, [
    { text: `a number from 0 to ${largestPower}` },
  ]);

/** An exponent inside an entry whose size is above 10 000. */
export const largeEntryExponent = (text: string, at: Span): ReadingError =>
  fault(text, at, `An exponent inside an entry is at most 10 000 in size, and ${quoted(text, at)} is more.`, [
    { text: `a number from -${largestEntryExponent} to ${largestEntryExponent}` },
  ]);

/** `2 3`: two numbers side by side are neither one number nor a product. */
export const adjacentNumbers = (text: string, left: Span, right: Span): ReadingError => {
  const first = /\d+$/.exec(text.slice(left.start, left.end))?.[0] ?? '';
  const second = /^\d+/.exec(text.slice(right.start))?.[0] ?? '';
  return fault(
    text,
    { start: right.start, end: right.start + second.length },
    `The numbers ${first} and ${second} stand side by side: write ${first}*${second} for their product.`,
    [{ text: '`*` between them', insert: '*' }],
  );
};

/** 𝔽_{p^d} with an exponent past every use. */
export const largeOrder = (text: string, at: Span): ReadingError =>
  fault(text, at, `The degree of a finite field is at most 1 000 here, and ${quoted(text, at)} is more.`, [
    { text: 'a number from 1 to 1000' },
  ]);

/** `eta2`: a power or a product. */
export const numberAfterWord = (text: string, word: Span, number: Span): ReadingError => {
  const w = quoted(text, word);
  const n = quoted(text, number);
  return fault(text, number, `${w}${n} can be read in two ways: write ${w}^${n} or ${n}${w}.`, [
    { text: `\`${w}^${n}\`` },
    { text: `\`${n}${w}\`` },
  ]);
};
