/** Shared memory in which a thread marks that it has begun a task; it crosses with the task. */
export type StartFlag = Int32Array<SharedArrayBuffer>;

export const newStartFlag = (): StartFlag => new Int32Array(new SharedArrayBuffer(4));

/** Called by the thread when it begins. */
export const markStarted = (flag: StartFlag): void => void Atomics.store(flag, 0, 1);

/** Milliseconds a task may wait for a thread that is still starting. */
const longestStart = 30_000;
/** The clock is read this many times before the wall is reached. */
const readings = 10;

export interface Wall {
  readonly signal: AbortSignal;
  /** To be called when the task has ended. */
  readonly clear: () => void;
}

/**
 * A signal that is aborted when a task has run for `milliseconds`, to a tenth more. Time in which its thread was still starting
 * does not count: on a busy machine a new thread takes longer than most tasks.
 */
export function wallAfter(milliseconds: number, flag: StartFlag): Wall {
  const controller = new AbortController();
  const period = milliseconds / readings;
  let [running, starting] = [0, 0];
  const timer = setInterval(() => {
    if (Atomics.load(flag, 0) === 1) running += 1;
    else starting += 1;
    if (running > readings || starting * period > longestStart) controller.abort();
  }, period);
  timer.unref();
  return { signal: controller.signal, clear: () => clearInterval(timer) };
}
