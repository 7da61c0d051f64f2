import type { Example } from '../contract';

/** Worked exchanges for the register; a test holds them against the running service. */
export const createExamples: readonly Example[] = [];
export const listExamples: readonly Example[] = [];
export const readExamples: readonly Example[] = [];
export const reviseExamples: readonly Example[] = [];
export const withdrawExamples: readonly Example[] = [];
