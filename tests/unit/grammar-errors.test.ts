import { describe, expect, it } from 'vitest';
import { readCondition, readElement, readExpression, readFieldName, readStatement } from '@/grammar/read';
import { ReadingError } from '@/grammar/reading-error';
import errors from '../vectors/language-errors.json';

const readers: Record<string, (text: string) => unknown> = {
  expression: readExpression,
  statement: readStatement,
  element: readElement,
  condition: readCondition,
  field: readFieldName,
};

function errorOf(read: (text: string) => unknown, text: string): ReadingError {
  try {
    read(text);
  } catch (error) {
    if (error instanceof ReadingError) return error;
    throw error;
  }
  throw new Error(`read without an error: ${text}`);
}

describe('every error says where it is, what is wrong and what could stand there', () => {
  it.each(errors.cases)('$read: $text', (wanted) => {
    const read = readers[wanted.read];
    if (!read) throw new Error(wanted.read);
    const error = errorOf(read, wanted.text);
    expect({
      line: error.line,
      column: error.column,
      message: error.message,
      expected: error.expected.map((piece) => piece.text),
      insert: error.expected.map((piece) => piece.insert ?? null),
      offending: error.offending,
      open: error.open ? wanted.text.slice(error.open.start, error.open.end) : null,
      excerpt: error.excerpt,
    }).toEqual({
      line: wanted.line,
      column: wanted.column,
      message: wanted.message,
      expected: wanted.expected,
      insert: wanted.insert,
      offending: wanted.offending,
      open: wanted.open,
      excerpt: wanted.excerpt,
    });
  });

  it('the message is the place and the detail', () => {
    const error = errorOf(readStatement, '[5][6] + <2> + <3 = [-1][6] + <5> + <30>');
    expect(error.message).toBe('Column 19. The bracket <3 is still open where = stands.');
    expect(error.detail).toBe('The bracket <3 is still open where = stands.');
    expect(error.excerpt).toBe('[5][6] + <2> + <3 = [-1][6] + <5> + <30>\n                  ^');
    expect(error.expected).toEqual([
      { text: '`>` to close it', insert: '>' },
      { text: '`,` and a further entry', insert: ', ' },
      { text: 'an operation such as `+` `*` `^`' },
    ]);
  });

  it('columns are counted in characters, offsets in UTF-16 units', () => {
    const error = errorOf(readExpression, '𝜂𝜂 @');
    expect([error.line, error.column, error.offset]).toEqual([1, 4, 5]);
    expect(error.excerpt).toBe('𝜂𝜂 @\n   ^');
  });

  it('a long line is shown around its error', () => {
    const error = errorOf(readExpression, `${'[2]+'.repeat(100)}@${'+[2]'.repeat(100)}`);
    const [line = '', caret = ''] = error.excerpt.split('\n');
    expect([...line].length).toBe(122);
    expect(line.charAt(caret.length - 1)).toBe('@');
  });
});

describe('limits', () => {
  const long = (characters: number): string => `[2]${' '.repeat(characters - 3)}`;

  it('an expression has at most 20 000 characters', () => {
    expect(readExpression(long(20_000)).kind).toBe('symbol');
    const error = errorOf(readExpression, long(20_001));
    expect(error.message).toBe('Column 1. An expression has at most 20 000 characters, and this one has 20 001.');
  });

  it('characters outside the basic plane count once', () => {
    expect(readExpression(`${'𝜂'.repeat(15_000)}`).kind).toBe('product');
  });

  it('each side of a statement has at most 20 000 characters', () => {
    expect(readStatement(`${long(20_000)}=${long(20_000)}`).sides).toHaveLength(2);
    const error = errorOf(readStatement, `[2] =${long(20_001)}= 0`);
    expect(error.message).toBe(
      'Column 6. A side of a statement has at most 20 000 characters, and this one has 20 001.',
    );
    expect(errorOf(readStatement, `[2]${'=[2]'.repeat(30_000)}`).message).toBe(
      'Column 1. A statement has at most 100 000 characters, and this one has 120 003.',
    );
  });

  it('brackets and divisions nest at most 200 deep', () => {
    const parentheses = (n: number): string => `${'('.repeat(n - 1)}[2]${')'.repeat(n - 1)}`;
    expect(readExpression(parentheses(200)).kind).toBe('symbol');
    expect(readExpression(`[${'(1+'.repeat(199)}2${')'.repeat(199)}]`).kind).toBe('symbol');
    expect(readExpression(`[1${'/a'.repeat(199)}]`).kind).toBe('symbol');
    expect(readExpression(`[${'1/a + '.repeat(1000)}1]`).kind).toBe('symbol');
    expect(() => readExpression(parentheses(201))).toThrow(ReadingError);
    expect(() => readExpression(`[1${'/a'.repeat(200)}]`)).toThrow(ReadingError);
  });

  it('exponents are bounded', () => {
    expect(readExpression('h^64').kind).toBe('power');
    expect(() => readExpression('h^65')).toThrow('Column 3. A power of an expression is at most 64, and 65 is more.');
    expect(readElement('t^-10000').kind).toBe('power');
    expect(() => readElement('t^-10001')).toThrow(
      'Column 3. An exponent inside an entry is at most 10 000 in size, and -10001 is more.',
    );
  });

  it('hostile texts end in a ReadingError or a tree', () => {
    for (const piece of [
      '(',
      '[',
      '<',
      '-',
      '+',
      '/',
      '^',
      '1/',
      'a',
      '2 ',
      '[2]^',
      '\\frac{',
      '\\',
      '$',
      '_',
      "'",
      '{',
      '²',
      '=',
      '\u0000',
      '\ud800',
    ]) {
      try {
        readStatement(piece.repeat(20_000 / piece.length));
      } catch (error) {
        expect(error).toBeInstanceOf(ReadingError);
      }
    }
  });
});
