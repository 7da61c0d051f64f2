import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { isSlug, longestSlug, slugOf, slugsNear } from '@/lib/contracts/slug';

describe('the short name of a group', () => {
  test.each([
    ['Skerry seminar', 'skerry-seminar'],
    ['Séminaire Skerry', 'seminaire-skerry'],
    ['Skerry 2', 'skerry2'],
    ['2 Skerries', 'skerries'],
    ['A¹-homotopy & forms', 'a1-homotopy-forms'],
    ['K-theory', 'k-theory'],
    ['北の島', ''],
    ['…', ''],
  ])('of %j is %j', (name, slug) => {
    expect(slugOf(name)).toBe(slug);
  });

  test.each(['skerry', 's', 'a1', 'skerry-2b', 'k-theory'])('may be %j', (slug) => {
    expect(isSlug(slug)).toBe(true);
  });

  test.each(['', '2skerry', 'skerry-6', 'skerry-', '-skerry', 'Skerry', 'skerry--b', 'skerry_b', 'a'.repeat(41), 'ä'])(
    'may not be %j',
    (slug) => {
      expect(isSlug(slug)).toBe(false);
    },
  );

  test('whatever a group is called, the short name that is proposed can be used, or there is none', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 120 }), (name) => {
        const slug = slugOf(name);
        expect(slug === '' || isSlug(slug)).toBe(true);
      }),
    );
  });

  test.each(['skerry', 'a'.repeat(longestSlug), 'a-b1', `${'a'.repeat(36)}-1b`])(
    'all that is proposed in place of %j can be used',
    (slug) => {
      const near = slugsNear(slug);
      expect(new Set(near).size).toBe(near.length);
      expect(near.filter((one) => !isSlug(one) || one === slug)).toEqual([]);
    },
  );
});
