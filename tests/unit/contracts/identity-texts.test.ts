import { expect, test } from 'vitest';
import { identityContent } from '@/lib/contracts/identity-content';
import { keyOf, partsOfKey } from '@/lib/contracts/identity-key';
import { arxiv, doi } from '@/lib/contracts/references';

test.each([
  ['10.1000/lemma-2', '10.1000/lemma-2'],
  [' 10.1000/182 ', '10.1000/182'],
  ['https://doi.org/10.1007/978-3-642-29514-0', '10.1007/978-3-642-29514-0'],
  ['http://dx.doi.org/10.1000.10/a%28b%29', '10.1000.10/a(b)'],
  ['doi.org/10.1000/x', '10.1000/x'],
  ['DOI: 10.1000/x', '10.1000/x'],
  ['10.1002/(SICI)1097-0258(19980815)17:15<1661::AID-SIM968>3.0.CO;2-2', undefined],
])('the DOI %j', (text, reduced) => {
  expect(doi.parse(text)).toBe(reduced ?? text);
});

test.each([
  '',
  '10.1000',
  '10.1/x',
  '11.1000/x',
  '10.1000/',
  '10.1000/a b',
  '10.1000/a\0',
  'https://elsewhere.example/10.1000/x',
  `10.1000/${'x'.repeat(201)}`,
])('%j is no DOI', (text) => {
  expect(doi.safeParse(text).success).toBe(false);
});

test.each([
  ['2301.01234', '2301.01234'],
  ['2301.01234v2', '2301.01234v2'],
  ['0704.0001', '0704.0001'],
  ['math/0301234', 'math/0301234'],
  ['math.AG/0301234v3', 'math.AG/0301234v3'],
  ['hep-th/9901001', 'hep-th/9901001'],
  ['arXiv:2301.01234v2', '2301.01234v2'],
  ['https://arxiv.org/abs/2301.01234', '2301.01234'],
  ['https://www.arxiv.org/pdf/2301.01234v1.pdf', '2301.01234v1'],
  ['http://export.arxiv.org/abs/math/0301234', 'math/0301234'],
])('the arXiv identifier %j', (text, reduced) => {
  expect(arxiv.parse(text)).toBe(reduced);
});

test.each([
  '',
  '2313.01234',
  '2301.123',
  '2301.01234v0',
  '2301.01234/x',
  'math/2301',
  'MATH/0301234',
  'https://elsewhere.example/abs/2301.01234',
])('%j is no arXiv identifier', (text) => {
  expect(arxiv.safeParse(text).success).toBe(false);
});

test('a key has a short name and a number, which are told apart whatever the short name is', () => {
  expect(partsOfKey('skerry-6')).toEqual({ slug: 'skerry', number: 6 });
  expect(partsOfKey('skerry-2a-10')).toEqual({ slug: 'skerry-2a', number: 10 });
  expect(partsOfKey(keyOf('a-b-c', 123456789))).toEqual({ slug: 'a-b-c', number: 123456789 });
  for (const key of [
    'skerry',
    'skerry-0',
    'skerry-06',
    'skerry-2-6',
    'Skerry-6',
    'skerry-6 ',
    'skerry-1234567890',
    `${'x'.repeat(120)}-6`,
  ])
    expect(partsOfKey(key), key).toBeUndefined();
});

const least = { name: 'Square', field: 'any', statement: '[a][a] = [-1][a]' };

test('what may be left out has its usual value, and blanks around texts are taken off', () => {
  expect(identityContent.parse({ ...least, name: '  Square ', remark: 'one\r\ntwo\n' })).toEqual({
    ...least,
    kind: 'equality',
    hypotheses: [],
    warning: false,
    tags: [],
    visibility: 'group',
    remark: 'one\ntwo',
  });
});

test('tags are small, and each is there once', () => {
  expect(identityContent.parse({ ...least, tags: ['Steinberg', 'degree-2', 'steinberg '] }).tags).toEqual([
    'steinberg',
    'degree-2',
  ]);
  for (const tag of ['', '-a', 'a b', 'a_b', 'ä', 'x'.repeat(41)])
    expect(identityContent.safeParse({ ...least, tags: [tag] }).success, tag).toBe(false);
});
