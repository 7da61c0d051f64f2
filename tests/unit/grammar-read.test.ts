import { describe, expect, it } from 'vitest';
import { conditionText, elementText, expressionText, fieldNameText, statementText } from '@/engine/expression/to-text';
import { expressionTex, fieldNameTex } from '@/engine/expression/to-tex';
import { readCondition, readElement, readExpression, readFieldName, readStatement } from '@/grammar/read';
import { ReadingError } from '@/grammar/reading-error';
import { withoutPlaces } from '../property/printers-trees';
import samples from '../vectors/language-samples.json';

/** Spellings that mean the same as the first of their row. */
const sameWords: readonly (readonly string[])[] = [
  ['eta^2', 'η^2', '\\eta^{2}', 'η²', 'eta ^ (2)', '$\\eta^2$', '\\(\\eta^2\\)', '\\[\\eta^2\\]', 'eta^{2}~'],
  ['<a>', '⟨a⟩', '\\langle a\\rangle', '\\left\\langle a \\right\\rangle', '\\bigl\\langle a\\bigr\\rangle'],
  [
    '<<a, b>>',
    '⟪a,b⟫',
    '\\langle\\!\\langle a,b\\rangle\\!\\rangle',
    '\\langle\\langle a, b\\rangle\\rangle',
    '⟨⟨a, b⟩⟩',
  ],
  ['[a, b]', '[a,b]', '\\left[a,\\,b\\right]', '[ a , b ]', '\\bigl[a,b\\bigr]', '[a,\n b]'],
  ['2*[a]', '2[a]', '2·[a]', '2\\cdot[a]', '2 \\cdot [a]', '2 × [a]', '2\\times[a]', '2 [a]'],
  ['[a] - [b]', '[a]−[b]', '[a] – [b]', '[a]&-[b]', '[a] \\\\ & - [b]'],
  ['3_eps', '3_ε', '3_{\\varepsilon}', '3_\\varepsilon', '3_{\\epsilon}', '3_{eps}'],
  ['(-2)_eps', '(−2)_ε', '( -2 )_{\\varepsilon}'],
  ['eps', 'ε', '\\varepsilon', '\\epsilon'],
  ['[x1]', '[x_1]', '[x_{1}]', '[x₁]'],
  ["[u']", '[u′]', '[u^{\\prime}]'],
  ['[a/b]', '[\\frac{a}{b}]', '[\\tfrac{a}{b}]', '[\\dfrac{a}{b}]', '[a∕b]'],
  ['[t^-1]', '[t^(-1)]', '[t^{-1}]', '[t⁻¹]', '[t^{−1}]'],
  ['[2t]', '[2*t]', '[2\\,t]', '[2\\cdot t]'],
  ['[a*b*(b + 1)]', '[ab(b+1)]', '[a b(b+1)]'],
  ['eta*eps*h', 'eta eps h', 'etaepsh', 'ηεh', '\\eta\\varepsilon h'],
];

describe('spellings of one word', () => {
  it.each(sameWords.map((row) => [row[0], row] as const))('%s', (_, row) => {
    const trees = row.map((text) => withoutPlaces(readExpression(text)));
    for (const tree of trees) expect(tree).toEqual(trees[0]);
  });
});

describe('what binds how', () => {
  it.each([
    ['-2[a]', '-(2[a])'],
    ['-[a]^2', '-([a]^2)'],
    ['2[a]^2', '2*([a]^2)'],
    ['-3_eps', '-(3_eps)'],
    ['[a] - [b] + [c]', '[a] + (-[b]) + [c]'],
    ['[a]*-[b]', '[a]*(-[b])'],
  ])('%s is %s', (short, long) => {
    expect(withoutPlaces(readExpression(short))).toEqual(withoutPlaces(readExpression(long)));
  });

  it.each([
    ['a/b*c', '(a/b)*c'],
    ['a/b/c', '(a/b)/c'],
    ['-a^2', '-(a^2)'],
    ['-a/b', '-(a/b)'],
    ['a/-b', 'a/(-b)'],
    ['2ab^2', '2*a*(b^2)'],
    ['1/2*1/t', '((1/2)*1)/t'],
    ['\\frac{1}{2}t', '(1/2)*t'],
  ])('inside an entry %s is %s', (short, long) => {
    expect(withoutPlaces(readElement(short))).toEqual(withoutPlaces(readElement(long)));
  });

  it('eta, eps and h are words outside brackets and letters inside', () => {
    expect(expressionText(readExpression('h[h]'))).toBe('h[h]');
    expect(withoutPlaces(readElement('eta'))).toEqual(withoutPlaces(readElement('e*t*a')));
  });
});

describe('statements and hypotheses', () => {
  it('a chain has all its sides', () => {
    expect(readStatement('[4] = h[2] = 2_eps[2]').sides).toHaveLength(3);
  });

  it('rows of an aligned display make a chain', () => {
    const rows = '\\begin{align*} [4] &= h[2] \\\\[4pt] &= 2_{\\varepsilon}[2] \\nonumber \\\\ \\end{align*}';
    expect(statementText(readStatement(rows))).toBe('[4] = h[2] = 2_eps[2]');
  });

  it('two separate equalities never run together', () => {
    expect(() => readStatement('[a] &= [b] \\\\ [c] &= [d]')).toThrow(ReadingError);
  });

  it('hypotheses follow a semicolon', () => {
    const text = '[a][1-a] = 0 ; a != 1, char != 2, b = 2c, char = 3';
    expect(statementText(readStatement(text))).toBe(text);
  });

  it.each([
    ['a ≠ b', 'a != b'],
    ['a\\ne b', 'a != b'],
    ['a \\not= b', 'a != b'],
    ['char≠2', 'char != 2'],
    ['\\operatorname{char}\\ne 2', 'char != 2'],
    ['chart = 1', 'chart = 1'],
  ])('%s is %s', (written, text) => {
    expect(conditionText(readCondition(written))).toBe(text);
  });
});

describe('names of fields', () => {
  it.each([
    ['Q', 'ℚ', '\\mathbb{Q}', '\\mathbb Q', '\\mathbf{Q}', '$\\mathbb{Q}$', ' Q '],
    ['R', 'ℝ', '\\mathbb{R}'],
    ['C', 'ℂ', '\\mathbf{C}'],
    ['Q_5', 'ℚ_5', '\\mathbb{Q}_5', '\\mathbb{Q}_{5}', 'ℚ₅'],
    ['F_7', '𝔽_7', '\\mathbb{F}_{7}', '\\mathbb{F}_7', '\\mathbf{F}_7', '𝔽₇'],
    ['F_9', 'F_{3^2}', '\\mathbb{F}_{3^{2}}'],
    ['F_9[y]/(y^2+z+1)', '\\mathbb{F}_9[y]/(y^{2}+z+1)', 'F_9[y]/\\left(y²+z+1\\right)'],
    ['F_3[z]/(z^2+1)'],
    ['Q[w]/(w^2-5)', 'ℚ[w]/(w²−5)'],
    ['F_7(t)', '𝔽_7(t)', '\\mathbb{F}_{7}\\left(t\\right)'],
    ['Q(t)[y]/(y^2-t)'],
    ['any', '\\mathrm{any}'],
  ])('%s', (...row) => {
    for (const text of row) expect(fieldNameText(readFieldName(text))).toBe(row[0]);
  });

  it('arithmetic is left to the engine', () => {
    for (const name of ['F_6', 'F_1', 'F_9(z)', 'F_9[z]/(z^2+z+1)', 'Q_4', 'F_3[z]/(0)']) {
      expect(fieldNameText(readFieldName(name))).toBe(name);
    }
  });
});

describe('sample texts', () => {
  it('every expression reads, and comes back from text and TeX', () => {
    expect(samples.expressions.length).toBeGreaterThan(300);
    for (const text of samples.expressions) {
      const tree = readExpression(text);
      expect(withoutPlaces(readExpression(expressionText(tree)))).toEqual(withoutPlaces(tree));
      expect(withoutPlaces(readExpression(expressionTex(tree)))).toEqual(withoutPlaces(tree));
    }
  });

  it('every element and every name of a field reads', () => {
    for (const text of samples.elements) {
      expect(withoutPlaces(readElement(elementText(readElement(text))))).toEqual(withoutPlaces(readElement(text)));
    }
    for (const text of samples.fields) {
      expect(withoutPlaces(readFieldName(fieldNameTex(readFieldName(text))))).toEqual(
        withoutPlaces(readFieldName(text)),
      );
    }
  });

  it.each(samples.refused)('$id: $why', ({ text, line, column, tolerance }) => {
    const error = (() => {
      try {
        return void readStatement(text);
      } catch (caught) {
        return caught;
      }
    })();
    expect(error).toBeInstanceOf(ReadingError);
    if (!(error instanceof ReadingError) || line === undefined || column === undefined) return;
    expect(error.line).toBe(line);
    expect(Math.abs(error.column - column)).toBeLessThanOrEqual(tolerance);
  });
});
