import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { differenceOf } from '@/app/_components/register/difference';

const marked = (before: string, after: string, kind?: 'statement' | 'prose') => {
  const { before: was, after: now } = differenceOf(before, after, kind);
  const show = (pieces: typeof was) =>
    pieces.map(({ kind: of, text }) => (of === 'both' ? text : of === 'gone' ? `−{${text}}` : `+{${text}}`)).join('');
  return [show(was), show(now)];
};

describe('what a revision changed', () => {
  test('a sign that is gone is marked alone', () => {
    expect(marked('[a][1+a] = -[-1][1+a]', '[a][1+a] = [-1][1+a]')).toEqual([
      '[a][1+a] = −{-}[-1][1+a]',
      '[a][1+a] = [-1][1+a]',
    ]);
  });

  test('a factor is marked as a whole, with all that stands in its bracket', () => {
    expect(marked('[7][10] = [7]<3>', '[7][10] = [-3]<3>')).toEqual(['[7][10] = −{[7]}<3>', '[7][10] = +{[-3]}<3>']);
    expect(marked('[x^2+1] = 0', '[x^2+2] = 0')).toEqual(['−{[x^2+1] }= 0', '+{[x^2+2] }= 0']);
  });

  test('other blanks are no difference', () => {
    expect(marked('[2]=[2]', '[2] = [2]')).toEqual(['[2]=[2]', '[2] = [2]']);
  });

  test('prose is compared by its words', () => {
    expect(marked('Seminar note 4', 'Seminar notes 4 and 5', 'prose')).toEqual([
      'Seminar −{note }4',
      'Seminar +{notes }4 +{and 5}',
    ]);
  });

  test('an unclosed bracket and an empty text are no trouble', () => {
    expect(marked('[2', '')).toEqual(['−{[2}', '']);
    expect(marked('', '[2')).toEqual(['', '+{[2}']);
  });

  test('whatever the texts, the pieces put together are the texts again', () => {
    const text = fc.array(fc.constantFrom('[', ']', '<', '>', '2', '+', ' = ', 'a', ';', '\\eta', ' '), {
      maxLength: 30,
    });
    fc.assert(
      fc.property(text, text, (a, b) => {
        const [before, after] = [a.join(''), b.join('')];
        const found = differenceOf(before, after);
        expect(found.before.map((piece) => piece.text).join('')).toBe(before);
        expect(found.after.map((piece) => piece.text).join('')).toBe(after);
      }),
    );
  });

  test('texts too long to be compared word by word are marked in the middle', () => {
    const many = (entry: string) => Array.from({ length: 1500 }, (_, index) => `[${entry}${index}]`).join('');
    const { before, after } = differenceOf(`[1]${many('2')}[9]`, `[1]${many('3')}[9]`);
    expect(before.map(({ kind }) => kind)).toEqual(['both', 'gone', 'both']);
    expect(after.map(({ kind }) => kind)).toEqual(['both', 'new', 'both']);
  });
});
