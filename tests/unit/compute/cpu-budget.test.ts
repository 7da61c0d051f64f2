import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { Refusal } from '@/engine/expression/refusal';
import { cpuBudget } from '@/lib/compute/cpu-budget';

// Both clocks are set by hand, so that nothing here depends on how fast the machine is.
let wall = 0;
let processor = 0;
beforeEach(() => {
  [wall, processor] = [1000, 5000];
  vi.spyOn(performance, 'now').mockImplementation(() => wall);
});
afterEach(() => vi.restoreAllMocks());

const pass = (milliseconds: number, share = 1) => {
  wall += milliseconds;
  processor += milliseconds * share;
};

test('it lets work go on up to its limit and then says what was being done', () => {
  const budget = cpuBudget(2, () => processor);
  pass(1999);
  budget.spend('factoring');
  pass(1);
  expect(() => budget.spend('factoring the entry 91')).toThrow(
    new Refusal(
      'budget',
      'Stopped after two seconds while factoring the entry 91. Write large entries as products of their factors, or ask about something smaller.',
    ),
  );
});

test('time in which the thread did not run does not count', () => {
  const budget = cpuBudget(2, () => processor);
  pass(6000, 0.25);
  budget.spend('waiting');
  pass(499);
  budget.spend('waiting');
  pass(21);
  expect(() => budget.spend('working')).toThrow(Refusal);
});
