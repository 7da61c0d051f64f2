import fc from 'fast-check';
import {
  integerElement,
  letterElement,
  negateElement,
  powerElement,
  productElement,
  quotientElement,
  sumElement,
  type Element,
} from '@/engine/expression/element';

const integer = (n: number): Element => (n < 0 ? negateElement(integerElement(BigInt(-n))) : integerElement(BigInt(n)));

/** ± a letter or a power of one, or a small integer. */
function plain(letters: readonly string[]): fc.Arbitrary<Element> {
  const letter = fc.constantFrom(...letters).map((name) => letterElement(name));
  return fc.oneof(
    { weight: 6, arbitrary: letter },
    { weight: 2, arbitrary: letter.map(negateElement) },
    { weight: 2, arbitrary: fc.tuple(letter, fc.constantFrom(2, -1, 3)).map(([a, e]) => powerElement(a, e)) },
    { weight: 2, arbitrary: fc.constantFrom(-1, 2, 3, -2, 1).map(integer) },
  );
}

/** Entries in letters that are sums, products and quotients of sums; some are zero. */
export function sumUnit(letters: readonly string[]): fc.Arbitrary<Element> {
  const part = plain(letters);
  const sum = fc.array(part, { minLength: 2, maxLength: 2 }).map(sumElement);
  return fc.oneof(
    { weight: 4, arbitrary: part },
    { weight: 4, arbitrary: sum },
    { weight: 2, arbitrary: fc.tuple(sum, part).map((factors) => productElement(factors)) },
    { weight: 1, arbitrary: fc.tuple(part, sum).map(([a, b]) => quotientElement(a, b)) },
  );
}

/** Small integers for letters, none of them zero. */
export const smallValues = (letters: readonly string[]): fc.Arbitrary<ReadonlyMap<string, Element>> =>
  fc
    .array(fc.constantFrom(2, 3, -1, -2, 5, 7, -3, 4, 6, 11), { minLength: letters.length, maxLength: letters.length })
    .map((values) => new Map(letters.map((name, i) => [name, integer(values[i] ?? 1)])));

/** Large integers for all letters of one character: what they have in common by chance is of no use to a proof. */
export const largeValues: fc.Arbitrary<ReadonlyMap<string, Element>> = fc
  .array(fc.integer({ min: 1_000_000, max: 1_000_000_000 }), { minLength: 26, maxLength: 26 })
  .map((values) => new Map(values.map((value, i) => [String.fromCharCode(97 + i), integer(value)])));
