import type { Budget } from '@/engine/arith/budget';
import { Refusal } from '@/engine/expression/refusal';
import { type ThreadClock, threadClock } from './thread-clock';

/** After the time of day says that the budget may be spent, the thread's own clock is asked this often (milliseconds). */
const patience = 20;

/**
 * A budget of processor time, starting now. Asking the thread's clock costs a system call; a thread cannot have had more
 * processor time than time has passed, so that one is asked first.
 */
export function cpuBudget(seconds: number, clock: ThreadClock = threadClock()): Budget {
  const limit = seconds * 1000;
  const startedAt = clock();
  let askAt = performance.now() + limit;
  return {
    spend(doing) {
      if (performance.now() < askAt) return;
      const spent = clock() - startedAt;
      if (spent >= limit) throw new Refusal('budget', stopped(seconds, doing));
      askAt = performance.now() + Math.max(patience, limit - spent);
    },
  };
}

const words: Readonly<Record<number, string>> = { 1: 'one second', 2: 'two seconds', 60: 'one minute' };

/** The sentence a person reads when the time is over. */
const stopped = (seconds: number, doing: string): string =>
  `Stopped after ${words[seconds] ?? `${seconds} seconds`} while ${doing}. ` +
  'Write large entries as products of their factors, or ask about something smaller.';
