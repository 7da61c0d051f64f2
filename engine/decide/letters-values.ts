import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import { shownCondition } from '../expression/shown';
import type { Condition } from '../expression/statement';
import {
  isZeroFunction,
  multiplyFunctions,
  negateFunction,
  polynomialFunction,
  powerFunction,
  substituteInFunction,
  sumFunctions,
  type LetterFunction,
} from '../field/letter-function';
import {
  coefficientsIn,
  degreeIn,
  letterPower,
  lettersIn,
  constantPolynomial,
  multiplyMulti,
  type LetterRing,
  type MultiPolynomial,
} from '../field/multivariate';
import { multiplicity } from '../field/multivariate-division';
import { readLetterFunction } from '../field/read-letter-function';
import { forEachElement, lettersOfElement } from './letters-seen';

/** How entries in letters are read over an unspecified field of a characteristic. */
export interface LetterValues {
  readonly ring: LetterRing;
  /** The value of an element, the letters that conditions solve for replaced. */
  read(element: Element): LetterFunction;
  /** The letters that were solved for, with their values in the others. */
  readonly solved: ReadonlyMap<string, LetterFunction>;
}

/**
 * The reader of entries over an unspecified field of this characteristic (0: functions over ℚ, p: over 𝔽_p), with the letters that
 * `a = …` conditions solve for replaced. Refuses conditions that contradict themselves or cannot be solved.
 */
export function letterValues(
  expressions: readonly Expression[],
  characteristic: bigint,
  conditions: readonly Condition[],
  budget: Budget,
): LetterValues {
  const names = new Set<string>();
  for (const expression of expressions) forEachElement(expression, (entry) => lettersOfElement(entry, names));
  for (const condition of conditions) {
    if (condition.kind === 'characteristic') continue;
    lettersOfElement(condition.left, names);
    lettersOfElement(condition.right, names);
  }
  const letters = [...names].sort(compareLetters);
  const placeOf = new Map(letters.map((name, i) => [name, i]));
  const ring: LetterRing = { letters, characteristic, budget };
  const solved = new Map<string, LetterFunction>();
  const plain = letters.map((_, i) => polynomialFunction(ring, letterPower(ring, i)));
  const letterValue = (name: string): LetterFunction => {
    const value = solved.get(name) ?? plain[placeOf.get(name) ?? -1];
    if (value === undefined) throw new RangeError('a letter that was not seen');
    return value;
  };
  const read = (element: Element): LetterFunction => readLetterFunction(element, ring, letterValue);
  const difference = (condition: Condition & { kind: 'equal' | 'unequal' }): LetterFunction =>
    sumFunctions(ring, [read(condition.left), negateFunction(ring, read(condition.right))]);

  for (const condition of conditions) {
    if (condition.kind !== 'equal') continue;
    const f = difference(condition);
    if (isZeroFunction(f)) continue;
    const solution = solve(ring, f, preferred(condition));
    if (solution === undefined)
      throw new Refusal(
        'hypothesis',
        `The condition ${shownCondition(condition)} cannot be solved for a letter. Write one letter, times a product of letters, on a side of its own.`,
        condition.at,
      );
    for (const [name, value] of solved) {
      const next = substituteInFunction(ring, value, solution.letter, solution.value);
      if (next === undefined || isZeroFunction(next))
        throw new Refusal(
          'hypothesis',
          next === undefined
            ? `Under the condition ${shownCondition(condition)} a denominator of another condition is 0.`
            : `Under the condition ${shownCondition(condition)} the letter ${name} would be 0, and letters are units.`,
          condition.at,
        );
      solved.set(name, next);
    }
    solved.set(letters[solution.letter] ?? 'a', solution.value);
  }
  for (const condition of conditions)
    if (condition.kind === 'unequal' && isZeroFunction(difference(condition)))
      throw new Refusal('hypothesis', `The condition ${shownCondition(condition)} never holds.`, condition.at);
  return { ring, read, solved };
}

interface Solution {
  readonly letter: number;
  readonly value: LetterFunction;
}

/**
 * Solves f = 0 for a letter of which the numerator, multiplied out, has degree 1, with something beside it, and in front of it ± a
 * product of letters and of denominators of f: what a condition divides by is a unit.
 */
function solve(ring: LetterRing, f: LetterFunction, first: readonly string[]): Solution | undefined {
  const { num } = f.constant;
  if (ring.characteristic === 0n && num !== 1n && num !== -1n) return undefined;
  let numerator: MultiPolynomial = constantPolynomial(ring, 1n);
  const denominators: MultiPolynomial[] = [];
  for (const { base, exponent } of f.factors.values()) {
    const isLetter = base.length === 1;
    // letters are units, so they may be left out; repeated factors have no degree 1
    if (isLetter) continue;
    if (exponent < 0n) {
      denominators.push(base);
      continue;
    }
    if (exponent > 1n) return undefined;
    numerator = multiplyMulti(ring, numerator, base);
  }
  const rank = (letter: number): number => (first.includes(ring.letters[letter] ?? '') ? 0 : 1);
  for (const letter of [...lettersIn(ring, numerator)].sort((a, b) => rank(a) - rank(b) || a - b)) {
    if (degreeIn(numerator, letter) !== 1) continue;
    const parts = coefficientsIn(numerator, letter);
    const [coefficient, rest] = [parts.get(1), parts.get(0)];
    if (coefficient === undefined || rest === undefined) continue;
    const [term, more] = denominators.reduce((left, base) => multiplicity(ring, left, base).rest, coefficient);
    if (term === undefined || more !== undefined) continue;
    const unit = term.coefficient === 1n || term.coefficient === -1n || ring.characteristic !== 0n;
    if (!unit) continue;
    const value = multiplyFunctions(
      ring,
      negateFunction(ring, polynomialFunction(ring, rest)),
      powerFunction(ring, polynomialFunction(ring, coefficient), -1n),
    );
    return { letter, value };
  }
  return undefined;
}

/** The letters that stand alone on a side: they are rather solved for than others. */
const preferred = ({ left, right }: Condition & { kind: 'equal' }): readonly string[] => {
  const [side] = [left, right].filter((element) => element.kind === 'letter');
  return side?.kind === 'letter' ? [side.name] : [];
};

/** The order of letters: by name, then by index as a number, then by primes. */
function compareLetters(a: string, b: string): number {
  const parts = (name: string): readonly [string, bigint, number] => {
    const digits = /[0-9]+/.exec(name)?.[0];
    return [name.charAt(0), digits === undefined ? -1n : BigInt(digits), name.length];
  };
  const [x, y] = [parts(a), parts(b)];
  if (x[0] !== y[0]) return x[0] < y[0] ? -1 : 1;
  if (x[1] !== y[1]) return x[1] < y[1] ? -1 : 1;
  return x[2] - y[2] || (a < b ? -1 : a > b ? 1 : 0);
}
