import type { Budget } from '../arith/budget';
import { integerElement, letterElement, negateElement, productElement, type Element } from '../expression/element';
import { substituteLetters } from '../expression/substitute';
import { polynomialFunction } from '../field/letter-function';
import { letterPower, lettersIn, type LetterRing } from '../field/multivariate';
import { readLetterFunction } from '../field/read-letter-function';
import type { LettersStatement } from './letters-statement';
import { tuples, valueOver, type Target } from './letters-targets';

/** How many tuples of values are looked at for each choice of free letters. */
const FREE_ASSIGNMENTS = 24;
/** With more letters than this none is left free. */
const LETTER_LIMIT = 8;

/**
 * Fields with letters left free, those with most of them first: the others get numbers, or multiples of a free letter, that turn
 * every entry into a constant times a product of letters.
 */
export function* freeTargets(statement: LettersStatement, patience: number, budget: Budget): Generator<Target> {
  const { ring, generators, solved } = statement;
  const letters = ring.letters.filter((name) => !solved.has(name));
  if (letters.length > LETTER_LIMIT) return;
  const sums = generators.flatMap((generator) => (generator.kind === 'polynomial' ? [generator] : []));
  const inSums = new Set(sums.flatMap(({ value }) => lettersIn(ring, value).map((i) => ring.letters[i] ?? '')));
  const bound = letters.filter((name) => inSums.has(name));
  for (const kept of properSubsets(bound)) {
    const given = bound.filter((name) => !kept.includes(name));
    const free = letters.filter((name) => !given.includes(name));
    if (free.length === 0) continue;
    const freeRing: LetterRing = { letters: free, characteristic: ring.characteristic, budget };
    const isMonomial = (element: Element): boolean => {
      const value = readLetterFunction(element, freeRing, (name) =>
        polynomialFunction(freeRing, letterPower(freeRing, free.indexOf(name))),
      );
      return value.constant.num !== 0n && [...value.factors.values()].every(({ base }) => base.length === 1);
    };
    yield {
      name: { kind: 'any' },
      *assignments() {
        for (const chosen of tuples(given, valuesBeside(kept), FREE_ASSIGNMENTS * patience, () => true)) {
          budget.spend('looking for a counterexample');
          if (sums.every(({ element }) => isMonomial(substituteLetters(element, chosen))))
            yield new Map<string, Element>([...chosen, ...free.map((name) => [name, letterElement(name)] as const)]);
        }
      },
      value: valueOver(freeRing),
    };
  }
}

const integer = (n: number): Element => (n < 0 ? negateElement(integerElement(BigInt(-n))) : integerElement(BigInt(n)));

const valuesBeside = (kept: readonly string[]): readonly Element[] => [
  ...[2, -1, 3, -2, 1].map(integer),
  ...kept.flatMap((name) => [
    negateElement(productElement([integer(2), letterElement(name)])),
    letterElement(name),
    productElement([integer(2), letterElement(name)]),
  ]),
];

/** The proper subsets, large ones first. */
function properSubsets(names: readonly string[]): readonly (readonly string[])[] {
  const all = names.reduce<readonly (readonly string[])[]>(
    (subsets, name) => [...subsets, ...subsets.map((subset) => [...subset, name])],
    [[]],
  );
  return all.filter((subset) => subset.length < names.length).sort((a, b) => b.length - a.length);
}
