import { expect, test } from 'vitest';
import { compareExamples } from '@/lib/contracts/examples/compare';
import type { CompareAnswer } from '@/lib/contracts/compare';
import { contradiction, degreesOf, sentenceOf, stateOf } from '@/lib/register/verdict';
import { searchable, searchQuery } from '@/lib/register/words';
import { checkVerdicts } from '@/models/identity-words';

test('checked is what the last check confirms, and nothing else', () => {
  for (const verdict of [...checkVerdicts, null]) {
    expect(stateOf(verdict, false)).toBe(verdict === 'equal' ? 'checked' : 'draft');
    expect(stateOf(verdict, true)).toBe(verdict === 'different' ? 'checked' : 'draft');
  }
});

test('only what the engine has shown to be otherwise is refused', () => {
  const codes = (warning: boolean) => checkVerdicts.map((verdict) => contradiction(verdict, warning, 'Why.')?.code);
  expect(codes(false)).toEqual([undefined, 'sides-differ', undefined, undefined, undefined]);
  expect(codes(true)).toEqual(['sides-agree', undefined, undefined, undefined, undefined]);
});

test('a verdict in words', () => {
  const answer = (change: Partial<CompareAnswer>): CompareAnswer => {
    const [example] = compareExamples;
    return { ...(example?.answer as CompareAnswer), chain: undefined, firstWrong: undefined, ...change };
  };
  const part = (degree: number) => ({ degree, verdict: 'equal' as const, group: { tex: '' }, compared: [] });
  const equal = answer({ verdict: 'equal', parts: [part(2), part(0), part(-1)] });
  expect(sentenceOf(equal)).toBe('The sides are equal, in degrees 2, 0 and -1.');
  expect(degreesOf(equal)).toEqual([2, 0, -1]);
  expect(sentenceOf(answer({ verdict: 'equal', parts: [] }))).toBe('The sides are equal.');
  expect(sentenceOf(answer({ verdict: 'equal', parts: [part(1)] }), 'Residue and value')).toBe(
    'Residue and value are equal, in degree 1.',
  );
  expect(sentenceOf(answer({ verdict: 'undecided' }), 'Residue and value')).toContain('tells residue and value apart');
});

test('a query has the words of any text as beginnings, and nothing of its signs', () => {
  expect(searchQuery('  Steinberg  SIX six ')).toBe('steinberg:* & six:*');
  expect(searchQuery(`Séminaire O'Connor & !x | (y) :* <-> \\ "z"`)).toBe(
    'seminaire:* & o:* & connor:* & x:* & y:* & z:*',
  );
  expect(searchQuery('[a][1+t²] = ⟨𝔽₇⟩')).toBe('a:* & 1:* & t2:* & f7:*');
  for (const nothing of ['', ' ', '!!! & |', '\0', '—']) expect(searchQuery(nothing)).toBeUndefined();
  expect(searchQuery('x'.repeat(500))).toBe(`${'x'.repeat(60)}:*`);
  expect(searchable('The [a], twice: [a]!')).toBe('the a twice a');
});
