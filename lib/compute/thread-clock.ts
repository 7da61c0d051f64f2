import { readFileSync, readlinkSync } from 'node:fs';

/** Milliseconds of processor time that a thread has had. */
export type ThreadClock = () => number;

/**
 * The number under which the system counts this thread; 0 where it keeps no such account. Linux keeps one for every thread in
 * /proc, open to all threads of the process (proc(5)).
 */
export function threadNumber(): number {
  try {
    return Number(/\d+$/.exec(readlinkSync('/proc/thread-self'))?.[0] ?? 0);
  } catch {
    return 0;
  }
}

/** Milliseconds of processor time of a thread of this process by its number; undefined when the system does not tell. */
export function processorTime(thread: number): number | undefined {
  try {
    const spent = Number(readFileSync(`/proc/self/task/${thread}/schedstat`, 'ascii').split(' ')[0]) / 1e6;
    return Number.isFinite(spent) ? spent : undefined;
  } catch {
    return undefined;
  }
}

/** The processor time of this thread; where the system does not tell, the time of day, which can only be stricter. */
export function threadClock(): ThreadClock {
  const thread = threadNumber();
  if (processorTime(thread) === undefined) return () => performance.now();
  return () => processorTime(thread) ?? performance.now();
}
