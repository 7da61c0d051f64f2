import { processorTime, threadNumber } from './thread-clock';

/** Shared memory in which a thread marks that it has begun a task, and which one it is; it crosses with the task. */
export type StartMark = Float64Array<SharedArrayBuffer>;

export const newStartMark = (): StartMark => new Float64Array(new SharedArrayBuffer(24));

/** Called by the thread when it begins. */
export function markStart(mark: StartMark): void {
  const thread = threadNumber();
  mark[1] = thread;
  mark[2] = processorTime(thread) ?? 0;
  mark[0] = 1;
}

/** Milliseconds of processor time past its budget that a thread has to stop by itself. */
const margin = 500;
/** The time of day at which a task ends in any case: this many times its budget, and a while for a thread that starts. */
const wallFactor = 10;
const longestStart = 20_000;
/** Milliseconds between two looks at a running thread; most tasks are over before the first. */
const interval = 100;

export interface Wall {
  readonly signal: AbortSignal;
  /** To be called when the task has ended. */
  readonly clear: () => void;
}

/**
 * A signal that is aborted when a thread does not stop by itself: when it has had more processor time than its budget and a
 * margin, or, where that cannot be told, when its time of day is over. A busy machine does not shorten a budget.
 */
export function wallAround(seconds: number, mark: StartMark): Wall {
  const controller = new AbortController();
  const askedAt = performance.now();
  const timer = setInterval(() => {
    const spent = mark[0] === 1 && mark[1] ? processorTime(mark[1]) : undefined;
    const overBudget = spent !== undefined && spent - (mark[2] ?? 0) > seconds * 1000 + margin;
    if (overBudget || performance.now() - askedAt > seconds * 1000 * wallFactor + longestStart) controller.abort();
  }, interval);
  timer.unref();
  return { signal: controller.signal, clear: () => clearInterval(timer) };
}
