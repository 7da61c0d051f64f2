import type { CounterexampleAnswer } from '@/lib/contracts/compare';

/** "a = 3, b = 2" in TeX: what the letters stand for in a counterexample. */
export const valuesTex = (values: CounterexampleAnswer['values']): string =>
  values.map(({ letter, tex }) => `${letter} = ${tex}`).join(',\\ ');
