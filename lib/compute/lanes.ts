/**
 * Two lanes. Every question first runs in the quick lane with a small share of its budget; one that needs more starts again in
 * the slow lane with all of it. So a short question waits behind others' first tenths of a second only, however many
 * long ones were asked, and a long one costs a few per cent more.
 */
export interface LaneSizes {
  /** Threads for first attempts. */
  readonly quick: number;
  /** Threads for what needs its whole budget. */
  readonly slow: number;
}

/** Seconds of processor time of a first attempt. */
export const quickSeconds = 0.15;

/** The lanes for a number of threads wanted: all of them quick, and one fewer, at least one, slow besides. */
export const laneSizes = (threads: number): LaneSizes => ({ quick: threads, slow: Math.max(1, threads - 1) });

/** Questions that wait before a lane, at most: about twenty seconds of work in either. */
export const longestQueues = ({ quick, slow }: LaneSizes): LaneSizes => ({ quick: 128 * quick, slow: 10 * slow });
