import type { Budget } from '../arith/budget';
import { isPrime } from '../arith/prime';
import { Refusal } from '../expression/refusal';
import type { Condition } from '../expression/statement';

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
