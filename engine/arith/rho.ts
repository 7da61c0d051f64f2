import type { Budget } from './budget';
import { gcd } from './gcd';

/** Differences are multiplied in runs of this length before one gcd is taken. */
const RUN = 128;

/**
 * A proper divisor of an odd composite n by Pollard's rho method in Brent's form, or `undefined` after `steps` steps.
 * A prime factor p takes about √p steps. R. Brent, An improved Monte Carlo factorization algorithm, BIT 20 (1980).
 * The sequences x ↦ x² + c, c = 1, 2, …, are fixed, so that the same n always takes the same way.
 */
export function rho(n: bigint, steps: number, budget: Budget, doing: string): bigint | undefined {
  let left = steps;
  for (let c = 1n; left > 0; c++) {
    let y = 2n;
    let x = y;
    let start = y;
    let product = 1n;
    let divisor = 1n;
    for (let stretch = 1; divisor === 1n && left > 0; stretch *= 2) {
      x = y;
      for (let i = 0; i < stretch; i++) y = (y * y + c) % n;
      left -= stretch;
      for (let done = 0; done < stretch && divisor === 1n && left > 0; done += RUN) {
        start = y;
        const run = stretch - done < RUN ? stretch - done : RUN;
        for (let i = 0; i < run; i++) {
          y = (y * y + c) % n;
          product = (product * (x > y ? x - y : y - x)) % n;
        }
        left -= run;
        divisor = gcd(product, n);
        budget.spend(doing);
      }
    }
    // All factors fell into one run: go through it again, one step at a time.
    if (divisor === n) {
      divisor = 1n;
      for (let y2 = start, i = 0; divisor === 1n && i < RUN; i++) {
        y2 = (y2 * y2 + c) % n;
        divisor = gcd(x > y2 ? x - y2 : y2 - x, n);
      }
    }
    if (divisor !== 1n && divisor !== n) return divisor;
  }
  return undefined;
}
