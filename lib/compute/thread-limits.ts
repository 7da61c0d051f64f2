import type { ResourceLimits } from 'node:worker_threads';

/**
 * What a compute thread may take, in MiB. A large decision makes some 5 kB of short-lived values for each prime in sight; with a
 * young generation of this size they are gone before a collection has to copy them, and cost stays linear in their number.
 */
export const threadLimits = (memoryMiB: number): ResourceLimits => ({
  maxOldGenerationSizeMb: memoryMiB,
  maxYoungGenerationSizeMb: 192,
  stackSizeMb: 4,
});
