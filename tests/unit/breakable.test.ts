import { expect, test } from 'vitest';
import { breakable } from '@/app/_components/math/breakable';
import { formulaHtml } from '@/app/_components/math/formula';

const plain = (tex: string) => tex.replaceAll(/\s+/g, ' ').trim();

test('a line may break before + − = outside brackets, and the sign opens the new line', () => {
  expect(plain(breakable('[5][6] + \\langle 2\\rangle = 1 - h'))).toBe(
    '[5][6] \\allowbreak +\\nobreak \\langle 2\\rangle \\allowbreak =\\nobreak 1 \\allowbreak -\\nobreak h',
  );
});

test('no line breaks inside a bracket, after a sign that stands first, or at any other operator', () => {
  expect(plain(breakable('-1'))).toBe('-1');
  expect(plain(breakable('[-1][a+b]'))).toBe('[-1][a+\\nobreak b]');
  expect(plain(breakable('\\langle a+b\\rangle'))).toBe('\\langle a+\\nobreak b\\rangle');
  expect(plain(breakable('2\\cdot 3'))).toBe('2\\cdot \\nobreak 3');
  expect(plain(breakable('x = -y'))).toBe('x \\allowbreak =\\nobreak -y');
});

test('what stands in braces is left alone', () => {
  expect(breakable('\\q{a+b}\\frac{1-x}{2}')).toBe('\\q{a+b}\\frac{1-x}{2}');
});

test('mathematics comes with MathML beside it, and TeX that cannot be set does not throw', () => {
  expect(formulaHtml('\\eta[a]')).toContain('<math');
  expect(formulaHtml('\\undefinedcommand{')).toContain('undefinedcommand');
});
