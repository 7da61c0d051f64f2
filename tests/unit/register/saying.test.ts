import { expect, test } from 'vitest';
import { sayingOf } from '@/app/_components/register/saying';
import { readAddress } from '@/app/_components/register/read-address';
import { registerHref } from '@/app/_components/register/address';
import { countFirst, shortName } from '@/app/_components/register/telling';

const set = (text: string, tex = text) => ({ text, tex });

test('an equality stands as it is, a warning with ≠, a chain of a warning with its own signs', () => {
  const statement = set('[6] = [2] + [3]');
  expect(sayingOf({ kind: 'equality', statement, warning: false })).toEqual(statement);
  expect(sayingOf({ kind: 'equality', statement, warning: true })).toEqual({
    text: '[6] ≠ [2] + [3]',
    tex: '[6] \\ne  [2] + [3]',
  });
  const chain = set('[6] = [2] = [3]');
  expect(sayingOf({ kind: 'equality', statement: chain, warning: true })).toEqual(chain);
});

test('a residue names its place, and its uniformizer where one is named', () => {
  const residue = {
    kind: 'residue',
    statement: set('[t]'),
    place: set('t-1'),
    value: set('0'),
    warning: false,
  } as const;
  expect(sayingOf(residue).tex).toBe('\\partial_{(t-1)}\\bigl([t]\\bigr) = 0');
  expect(sayingOf({ ...residue, place: set('7'), uniformizer: set('14'), warning: true })).toEqual({
    text: 'residue at 7 against 14 of [t] ≠ 0',
    tex: '\\partial_{7}^{14}\\bigl([t]\\bigr) \\ne 0',
  });
});

test('an address is read as far as it can be, and written as short as it can be', () => {
  const given = {
    words: ' steinberg ',
    state: 'draft',
    tag: '',
    degree: 'two',
    sort: '-changed',
    cursor: 'abc',
    seen: '25',
  };
  const { query, before } = readAddress(given);
  expect(query).toEqual({ words: 'steinberg', state: 'draft', sort: '-changed', limit: 25, cursor: 'abc' });
  expect(before).toBe(25);
  expect(registerHref(query)).toBe('/register?words=steinberg&state=draft');
  expect(registerHref(query, { words: undefined, state: undefined })).toBe('/register');
  expect(registerHref(query, { cursor: 'def', seen: '50' })).toBe(
    '/register?words=steinberg&state=draft&cursor=def&seen=50',
  );
  expect(readAddress({ state: ['checked', 'draft'], seen: '10' })).toMatchObject({
    query: { state: 'checked' },
    before: 0,
  });
});

test('names and numbers are short', () => {
  expect([shortName('Tobias Renk'), shortName('Hypatia'), shortName('Ada  B. Cole')]).toEqual([
    'T. Renk',
    'Hypatia',
    'A. Cole',
  ]);
  expect([countFirst(9), countFirst(13)]).toEqual(['Nine', '13']);
});
