import { expect, test } from 'vitest';
import { compareRequest } from '@/lib/contracts/compare';
import { compareManyRequest } from '@/lib/contracts/compare-many';
import { residuesRequest } from '@/lib/contracts/residues';
import { shapeProblem } from '@/lib/contracts/shape';
import type { z } from 'zod';

/** What a caller reads about a body, or undefined when it has the right shape. */
function complaint(schema: z.ZodType, text: string) {
  const body: unknown = JSON.parse(text);
  const read = schema.safeParse(body);
  return read.success ? undefined : shapeProblem(read.error, body).errors;
}

test('a comparison takes two sides or a statement', () => {
  expect(complaint(compareRequest, '{"field":"Q","left":"1","right":"1"}')).toBeUndefined();
  expect(complaint(compareRequest, '{"field":"Q","statement":"1=1"}')).toBeUndefined();
  const either = [{ key: '', detail: 'Give `left` and `right`, or `statement` alone.' }];
  expect(complaint(compareRequest, '{"field":"Q"}')).toEqual(either);
  expect(complaint(compareRequest, '{"field":"Q","left":"1"}')).toEqual(either);
  expect(complaint(compareRequest, '{"field":"Q","statement":"1=1","right":"1"}')).toEqual(either);
});

test('a missing key, a key of the wrong type and an unknown key are each named', () => {
  expect(complaint(residuesRequest, '{"expression":[],"places":["2",3],"feild":"Q"}')).toEqual([
    { key: 'field', detail: 'The key “field” is missing.' },
    { key: 'expression', detail: 'The key “expression” must be a string.' },
    { key: 'places[1]', detail: 'The key “places[1]” must be a string.' },
    { key: 'feild', detail: 'There is no key “feild” here.' },
  ]);
});

test('null is a wrong type, not a missing key', () => {
  expect(complaint(residuesRequest, '{"field":null,"expression":"1"}')).toEqual([
    { key: 'field', detail: 'The key “field” must be a string.' },
  ]);
});

test('the keys that JavaScript objects inherit are unknown keys like others', () => {
  const details = complaint(residuesRequest, '{"field":"Q","expression":"1","__proto__":{},"constructor":1}');
  expect(details?.map(({ key }) => key)).toEqual(['__proto__', 'constructor']);
});

test('a uniformizer goes with exactly one place', () => {
  const refused = [
    { key: 'uniformizer', detail: 'A uniformizer goes with exactly one place: give `places` with one entry.' },
  ];
  expect(complaint(residuesRequest, '{"field":"Q","expression":"1","uniformizer":"7"}')).toEqual(refused);
  expect(complaint(residuesRequest, '{"field":"Q","expression":"1","uniformizer":"7","places":["7","5"]}')).toEqual(
    refused,
  );
  expect(complaint(residuesRequest, '{"field":"Q","expression":"1","uniformizer":"7","places":["7"]}')).toBeUndefined();
});

test('many comparisons are at least one and at most 500', () => {
  const many = (length: number) => JSON.stringify({ compares: Array.from({ length }, () => ({})) });
  expect(complaint(compareManyRequest, many(500))).toBeUndefined();
  expect(complaint(compareManyRequest, many(0))?.[0]?.detail).toBe('The key “compares” must have at least 1 entry.');
  expect(complaint(compareManyRequest, many(501))?.[0]?.detail).toBe(
    'The key “compares” may have at most 500 entries.',
  );
});

test('a flood of unknown keys makes a short message', () => {
  const flood = Object.fromEntries(Array.from({ length: 5000 }, (_, index) => [`${index}`.padEnd(200, 'x'), 1]));
  const errors = complaint(residuesRequest, JSON.stringify(flood));
  expect(errors).toHaveLength(20);
  for (const { detail } of errors ?? []) expect(detail.length).toBeLessThan(120);
});
