import { expect, test } from 'vitest';
import { csvLine } from '@/lib/export/csv';

test('cells are joined by commas and a line ends as RFC 4180 says', () => {
  expect(csvLine(['skerry-6', 7, null, ''])).toBe('skerry-6,7,,\r\n');
});

test.each([
  ['a comma', 'a, b', '"a, b"'],
  ['a quotation mark', 'the “word” "h"', '"the “word” ""h"""'],
  ['a line end', 'a\nb', '"a\nb"'],
  ['a space at its edge', ' a', '" a"'],
])('a cell with %s is quoted', (_, cell, written) => {
  expect(csvLine([cell])).toBe(`${written}\r\n`);
});

test.each(['=1+1', '+1', '-[2] = 0', '@SUM(A1)', '\t=1', '\r=1', '＝1+1', '＠SUM'])(
  '%j is no formula to a spreadsheet',
  (cell) => {
    const written = csvLine(['first', cell]);
    expect(written.replace('first,', '').replace(/^"/, '')).toMatch(/^'/);
  },
);

test('numbers below zero stay numbers', () => {
  expect(csvLine([-3])).toBe('-3\r\n');
});
