import { grammar } from 'ohm-js';
import { describe, expect, it } from 'vitest';
import { examples } from '@/grammar/examples';
import { grammarModule, grammarText } from '@/grammar/write-source';
import { readFileSync } from 'node:fs';

const rules = grammar(grammarText());

/** Rules that have no meaning of their own; they are met through the rules that use them. */
const partsOfOthers = new Set([
  'braced',
  'between',
  'dressed',
  'parenthesised',
  'twice',
  'boldface',
  'beginning',
  'ending',
  'equals',
  'index',

  'latin',
  'digits',
  'integer',
  'letterMarks',
  'lowered',
  'raised',
  'raisedPrime',
  'superscript',
  'subscriptDigits',
  'prime',
  'primePower',
  'elementGroup',
  'minus',
  'otherTimes',
  'angleOpen',
  'angleClose',
  'pfisterOpen',
  'pfisterClose',
  'struckEquals',
  'uprightChar',
  'epsilonIndex',
  'blank',
  'texBlankWord',
  'rowSpace',
  'rowStart',
]);

describe('examples beside the rules', () => {
  for (const [rule, { accepted, refused }] of Object.entries(examples)) {
    it(`${rule} reads what it should and nothing else`, () => {
      const read = (text: string): boolean => rules.match(text, rule).succeeded();
      expect(accepted.filter((text) => !read(text))).toEqual([]);
      expect(refused.filter(read)).toEqual([]);
    });
  }

  it('every rule that a person meets has examples of both kinds', () => {
    expect(Object.entries(examples).filter(([, e]) => e.accepted.length === 0 || e.refused.length === 0)).toEqual([]);
    const named = Object.keys(rules.rules).filter((rule) => !rule.includes('_') && Object.hasOwn(rules.rules, rule));
    expect(named.filter((rule) => !(rule in examples) && !partsOfOthers.has(rule))).toEqual([]);
  });
});

describe('the grammar as a module', () => {
  it('carries the text of quadrel.ohm', () => {
    expect(readFileSync(new URL('../../grammar/quadrel-recipe.ts', import.meta.url), 'utf8')).toBe(grammarModule());
  });
});
