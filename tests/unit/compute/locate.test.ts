import { expect, test } from 'vitest';
import { eta, symbol } from '@/engine/expression/expression';
import { integerElement } from '@/engine/expression/element';
import { locate } from '@/lib/compute/locate';
import { sourceOf } from '@/lib/compute/source';

test('lines and columns count from 1, and carets stand under the stretch', () => {
  expect(locate('[0]', { start: 1, end: 2 })).toEqual({ line: 1, column: 2, excerpt: '[0]\n ^' });
  expect(locate('[2]\n + [1-1]', { start: 8, end: 11 })).toEqual({ line: 2, column: 5, excerpt: ' + [1-1]\n    ^^^' });
  expect(locate('[2]\r\n[0]', { start: 6, end: 7 })).toMatchObject({ line: 2, column: 2 });
});

test('columns count characters, not the units they are stored in', () => {
  expect(locate('𝔽𝔽[0]', { start: 5, end: 6 })).toEqual({ line: 1, column: 4, excerpt: '𝔽𝔽[0]\n   ^' });
});

test('the end of the text and an empty stretch are places too', () => {
  expect(locate('[2', { start: 2, end: 2 })).toEqual({ line: 1, column: 3, excerpt: '[2\n  ^' });
  expect(locate('', { start: 9, end: 9 })).toEqual({ line: 1, column: 1, excerpt: '\n^' });
});

test('a long line is cut around the stretch', () => {
  const { column, excerpt } = locate(`${'a'.repeat(500)}X${'b'.repeat(500)}`, { start: 500, end: 501 });
  const [line = '', carets = ''] = excerpt.split('\n');
  expect(column).toBe(501);
  expect(line.length).toBeLessThan(130);
  expect(line[carets.indexOf('^')]).toBe('X');
});

test('a stretch belongs to the tree that holds it, though another has the same offsets', () => {
  const [there, here] = [0, 1].map(() => ({ start: 1, end: 2 }));
  const tree = (at: { start: number; end: number } | undefined) =>
    symbol([integerElement(0n, at)], { start: 0, end: 3 });
  const sources = [
    { part: 'left', text: '[0]', tree: tree(there) },
    { part: 'right', text: '[0]', tree: tree(here) },
  ];
  if (here === undefined || there === undefined) throw new Error('unreachable');
  expect(sourceOf(there, sources)?.part).toBe('left');
  expect(sourceOf(here, sources)?.part).toBe('right');
  expect(sourceOf({ start: 1, end: 2 }, sources)).toBeUndefined();
  expect(sourceOf({ start: 1, end: 2 }, [...sources.slice(1), { part: 'x', text: 'eta', tree: eta() }])?.part).toBe(
    'right',
  );
});
