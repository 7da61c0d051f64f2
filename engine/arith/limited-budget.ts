import type { Budget } from './budget';

/** Thrown when a search has taken as many steps as it may. */
export class Exhausted extends Error {
  override readonly name = 'Exhausted';
}

/** A part of a budget: so many steps, and then `Exhausted` is thrown. What ends the whole budget ends this one too. */
export function limitedBudget(budget: Budget, steps: number): Budget {
  let left = steps;
  return {
    spend(doing) {
      budget.spend(doing);
      left -= 1;
      if (left < 0) throw new Exhausted(`the limit on steps was reached while ${doing}`);
    },
  };
}

/** What a search gives, or `otherwise` when its steps were not enough. */
export function unlessExhausted<T>(search: () => T, otherwise: (reached: Exhausted) => T): T {
  try {
    return search();
  } catch (error) {
    if (error instanceof Exhausted) return otherwise(error);
    throw error;
  }
}
