import type { Budget } from '../arith/budget';
import { isPrime } from '../arith/prime';
import type { Element } from '../expression/element';
import { Refusal } from '../expression/refusal';
import type { Condition } from '../expression/statement';
import { shownCondition } from '../expression/shown';
import type { Field } from '../field/field';
import { laurentPower, laurentRing, readLaurent, type Laurent, type LaurentRing } from '../field/laurent';
import { primeField } from '../field/prime-field';
import { rationals } from '../field/rational';

/** The characteristic that the conditions fix, 0 if they fix none. Refuses conditions on it that contradict each other. */
export function characteristicOf(conditions: readonly Condition[], budget: Budget): bigint {
  let fixed = 0n;
  for (const condition of conditions) {
    if (condition.kind !== 'characteristic') continue;
    if (!isPrime(condition.prime, budget))
      throw new Refusal('hypothesis', `${condition.prime} is not a prime, so it is no characteristic.`, condition.at);
    if (!condition.is) continue;
    if (fixed !== 0n && fixed !== condition.prime)
      throw new Refusal(
        'hypothesis',
        `The characteristic cannot be both ${fixed} and ${condition.prime}.`,
        condition.at,
      );
    fixed = condition.prime;
  }
  for (const condition of conditions)
    if (condition.kind === 'characteristic' && !condition.is && condition.prime === fixed)
      throw new Refusal('hypothesis', `The characteristic cannot be ${fixed} and also not ${fixed}.`, condition.at);
  return fixed;
}

/** What an entry in letters is: zero, ± a product of letters (±1 among them), another constant, or something else. */
export type LetterEntry =
  | { readonly kind: 'zero' | 'other' }
  | { readonly kind: 'constant'; readonly value: Element }
  | { readonly kind: 'signed'; readonly negative: boolean; readonly exponents: ReadonlyMap<string, bigint> };

/**
 * The reader of entries over an unspecified field of this characteristic (0: the coefficients are ℚ, p: 𝔽_p), with the letters
 * that `a = …` conditions solve for replaced. Refuses conditions that contradict themselves or cannot be solved.
 */
export function lettersReader(
  characteristic: bigint,
  conditions: readonly Condition[],
  budget: Budget,
): (element: Element) => LetterEntry {
  return characteristic === 0n
    ? readerOver(rationals, conditions, budget)
    : readerOver(primeField(characteristic), conditions, budget);
}

function readerOver<E>(
  field: Field<E>,
  conditions: readonly Condition[],
  budget: Budget,
): (element: Element) => LetterEntry {
  const ring = laurentRing(field, budget);
  const solved = new Map<string, Laurent<E>>();
  const letterValue = (name: string): Laurent<E> => solved.get(name) ?? ring.letter(name);
  const read = (element: Element): Laurent<E> => readLaurent(element, ring, letterValue);
  const difference = (condition: Condition & { kind: 'equal' | 'unequal' }): Laurent<E> =>
    ring.add(read(condition.left), ring.negate(read(condition.right)));

  for (const condition of conditions) {
    if (condition.kind !== 'equal') continue;
    const f = difference(condition);
    if (f.size === 0) continue;
    const solution = solve(f, ring);
    if (solution === undefined)
      throw new Refusal(
        'hypothesis',
        `The condition ${shownCondition(condition)} cannot be solved for a letter. Write one letter, times a product of letters, on a side of its own.`,
        condition.at,
      );
    for (const [name, value] of solved) solved.set(name, substitute(value, solution, ring));
    solved.set(solution.name, solution.value);
  }
  for (const condition of conditions)
    if (condition.kind === 'unequal' && difference(condition).size === 0)
      throw new Refusal('hypothesis', `The condition ${shownCondition(condition)} never holds.`, condition.at);
  return (element) => classify(read(element), field);
}

function classify<E>(f: Laurent<E>, field: Field<E>): LetterEntry {
  const [term, more] = f.values();
  if (term === undefined) return { kind: 'zero' };
  if (more !== undefined) return { kind: 'other' };
  const positive = field.equal(term.coefficient, field.one);
  if (positive || field.equal(term.coefficient, field.negate(field.one)))
    return { kind: 'signed', negative: !positive, exponents: term.exponents };
  return term.exponents.size === 0 ? { kind: 'constant', value: field.write(term.coefficient) } : { kind: 'other' };
}

interface Solution<E> {
  readonly name: string;
  readonly value: Laurent<E>;
}

/** Solves f = 0 for a letter that occurs in one term only, to the power 1 or −1, with ± a product of letters beside it. */
function solve<E>(f: Laurent<E>, ring: LaurentRing<E>): Solution<E> | undefined {
  const { one, negate, equal } = ring.field;
  for (const [key, term] of f) {
    if (!equal(term.coefficient, one) && !equal(term.coefficient, negate(one))) continue;
    for (const [name, e] of term.exponents) {
      if (e !== 1n && e !== -1n) continue;
      const others = [...f].filter(([other]) => other !== key);
      if (others.length === 0 || others.some(([, { exponents }]) => exponents.has(name))) continue;
      const cofactor = ring.multiply(new Map([[key, term]]), e === 1n ? inverseLetter(name, ring) : ring.letter(name));
      const rest = ring.negate(new Map(others));
      const value = e === 1n ? ring.multiply(rest, ring.invert(cofactor) ?? new Map()) : ring.invert(rest);
      if (value === undefined) continue;
      return { name, value: e === 1n ? value : ring.multiply(cofactor, value) };
    }
  }
  return undefined;
}

const inverseLetter = <E>(name: string, ring: LaurentRing<E>): Laurent<E> =>
  ring.invert(ring.letter(name)) ?? new Map();

function substitute<E>(f: Laurent<E>, { name, value }: Solution<E>, ring: LaurentRing<E>): Laurent<E> {
  let result: Laurent<E> = new Map();
  for (const [key, term] of f) {
    const e = term.exponents.get(name) ?? 0n;
    const without = ring.multiply(new Map([[key, term]]), laurentPower(ring.letter(name), -e, ring));
    result = ring.add(result, e === 0n ? without : ring.multiply(without, laurentPower(value, e, ring)));
  }
  return result;
}
