import type { Budget } from '../arith/budget';
import { limitedBudget, unlessExhausted } from '../arith/limited-budget';
import { negateElement, sumElement, type Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import type { FieldName } from '../expression/field-name';
import { mapEntries } from '../expression/map-entries';
import { Refusal } from '../expression/refusal';
import type { Condition } from '../expression/statement';
import { substituteLetters } from '../expression/substitute';
import { writeLetterFunction } from '../field/write-letter-function';
import type { DecidableField } from './decidable-field';
import type { Finding } from './finding';
import type { LettersStatement } from './letters-statement';
import { freeTargets } from './letters-free-targets';
import { concreteTargets, type Assignment, type Target } from './letters-targets';
import type { Counterexample, NamedField, SearchLimit, TriedField } from './outcome';

/** What a search for a counterexample came to. */
export interface Refutation {
  readonly counterexample?: Counterexample;
  /** What differs there: the findings in the degrees that were asked about. */
  readonly findings: readonly Finding[];
  readonly theorem?: string;
  readonly tried: readonly TriedField[];
  readonly limit: SearchLimit;
}

/** A statement about an unspecified field, as it was typed and as it was read. */
export interface Claim {
  readonly left: Expression;
  readonly right: Expression;
  readonly conditions: readonly Condition[];
  readonly statement: LettersStatement;
}

interface Question extends Claim {
  /** The degrees in which a difference is looked for. */
  readonly degrees: ReadonlySet<number>;
  /** How many times longer than usual to look: a difference may be known to be there. */
  readonly patience: number;
}

/** Decides over the field of a name; the letters that are left free stand for themselves in `any`. */
export type DecideOver = (name: FieldName) => Pick<DecidableField, 'name' | 'tex' | 'decide'>;

/**
 * Looks for values of the letters at which the sides differ: with some letters left free, so that canonical words decide in every
 * degree, then over finite fields, ℚ, ℚ(t) and 𝔽_p(t), small values first. Values are lawful when all entries are units and the
 * conditions hold. The order is fixed, every field has a fixed number of values, and all ends after so many steps.
 */
export function searchCounterexample(
  question: Question,
  decideOver: DecideOver,
  steps: number,
  whole: Budget,
): Refutation {
  const budget = limitedBudget(whole, steps);
  const tried: TriedField[] = [];
  let reached = false;
  for (const target of targetsOf(question, budget)) {
    if (isSpent(budget)) {
      reached = true;
      break;
    }
    const found = searchIn(target, question, decideOver, limitedBudget(budget, steps >> 1));
    if (found === undefined) continue;
    reached ||= found.ended;
    const known = tried.findIndex(({ field }) => field.name === found.field.name);
    const entry = { field: found.field, values: found.values + (tried[known]?.values ?? 0) };
    if (known >= 0) tried[known] = entry;
    else tried.push(entry);
    if (found.failure !== undefined) return { ...found.failure, tried, limit: { steps, reached: false } };
  }
  return { findings: [], tried, limit: { steps, reached } };
}

const isSpent = (budget: Budget): boolean =>
  unlessExhausted(
    () => {
      budget.spend('looking for a counterexample');
      return false;
    },
    () => true,
  );

function targetsOf({ conditions, statement, patience, degrees }: Question, budget: Budget): readonly Target[] {
  const excluded = new Set(conditions.flatMap((c) => (c.kind === 'characteristic' && !c.is ? [c.prime] : [])));
  return unlessExhausted(
    () => {
      const free = [...freeTargets(statement, patience, budget)];
      const concrete = concreteTargets(statement.characteristic, excluded, patience, budget);
      const of = (kind: Target['name']['kind']): readonly Target[] => concrete.filter(({ name }) => name.kind === kind);
      const [rationals, functions] = [of('rationals'), of('functions')];
      // of symbols of degree ≥ 3 nothing is left over finite fields, and little over Q and F_p(t)
      return Math.min(...degrees) > 2
        ? [...rationals, ...free, ...functions, ...of('finite')]
        : [...of('finite'), ...rationals, ...free, ...functions];
    },
    () => [],
  );
}

interface Found {
  readonly field: NamedField;
  /** How many lawful values gave no difference. */
  readonly values: number;
  /** Whether the budget ended the search. */
  readonly ended: boolean;
  /** What a value that separates the sides gives. */
  readonly failure?: Pick<Refutation, 'counterexample' | 'findings' | 'theorem'>;
}

/** The search in one field; `undefined` where the field is not decided. */
function searchIn(target: Target, question: Question, decideOver: DecideOver, budget: Budget): Found | undefined {
  const { statement, conditions } = question;
  const assigned = statement.ring.letters.filter((name) => !statement.solved.has(name));
  const kept = conditions.filter((c) => target.name.kind === 'any' && c.kind === 'characteristic');
  const field = unlessPassedOver(() => decideOver(target.name));
  if (field === undefined) return undefined;
  const named = { name: field.name, tex: field.tex };
  let values = 0;
  const failure = unlessExhausted<Found['failure'] | 'ended'>(
    () => {
      for (const assignment of target.assignments(assigned)) {
        budget.spend('looking for a counterexample');
        const lawful = valuesAt(target, question, assignment);
        if (lawful === undefined) continue;
        const decision = unlessPassedOver(() => field.decide(lawful.left, lawful.right, kept, budget));
        if (decision === undefined) continue;
        const unseen = decision.open?.some(({ degree, verdict }) => verdict && question.degrees.has(degree)) ?? false;
        const apart = new Set(
          decision.findings.flatMap(({ same, degree }) => (!same && question.degrees.has(degree) ? [degree] : [])),
        );
        if (apart.size > 0)
          return {
            counterexample: {
              field: named,
              values: lawful.values,
              statement: { sides: [lawful.left, lawful.right], conditions: kept },
            },
            findings: decision.findings.filter(({ degree }) => apart.has(degree)),
            theorem: decision.theorem,
          };
        if (!unseen) values += 1;
      }
      return undefined;
    },
    () => 'ended',
  );
  if (failure === 'ended') return { field: named, values, ended: true };
  return { field: named, values, ended: false, ...(failure && { failure }) };
}

/** Values that a field cannot be asked about are passed over. */
function unlessPassedOver<T>(question: () => T): T | undefined {
  try {
    return question();
  } catch (error) {
    if (isPassedOver(error)) return undefined;
    throw error;
  }
}

const isPassedOver = (error: unknown): error is Refusal =>
  error instanceof Refusal && (error.code === 'not-yet' || error.code === 'size');

interface Lawful {
  readonly left: Expression;
  readonly right: Expression;
  readonly values: Counterexample['values'];
}

/** Both sides with values for their letters, `undefined` where an entry is no unit or a condition fails. */
function valuesAt(
  target: Target,
  { left, right, conditions, statement }: Question,
  chosen: Assignment,
): Lawful | undefined {
  const { ring, solved } = statement;
  const all = new Map<string, Element>();
  try {
    // letters are units, whether they stand alone or not
    const give = (name: string, element: Element): void => {
      const value = target.value(element);
      if (value === 'zero') throw new Unlawful();
      all.set(name, value);
    };
    for (const [name, element] of chosen) give(name, element);
    for (const [name, value] of solved) give(name, substituteLetters(writeLetterFunction(ring, value), chosen));
    const at = (element: Element): Element => {
      const value = target.value(substituteLetters(element, all));
      if (value === 'zero') throw new Unlawful();
      return value;
    };
    for (const condition of conditions)
      if (condition.kind === 'unequal') at(sumElement([condition.left, negateElement(condition.right)]));
    const sides = [mapEntries(left, at), mapEntries(right, at)] as const;
    const values = ring.letters.flatMap((letter) => {
      const value = all.get(letter);
      return value === undefined || isItself(value, letter) ? [] : [{ letter, value }];
    });
    return { left: sides[0], right: sides[1], values };
  } catch (error) {
    if (error instanceof Unlawful) return undefined;
    const meaningless = error instanceof Refusal && ['division-by-zero', 'not-a-unit', 'size'].includes(error.code);
    if (meaningless) return undefined;
    throw error;
  }
}

/** Values at which an entry is 0 or a condition fails. */
class Unlawful extends Error {}

const isItself = (value: Element, letter: string): boolean => value.kind === 'letter' && value.name === letter;
