import type { Draft } from './drafts';

/** True and false statements to begin with, one for each thing the bench can say. */
export const examples: readonly (Draft & { readonly shows: string })[] = [
  { field: 'Q', statement: '[5][6] + <2> + <3> = [-1][6] + <5> + <30>', shows: 'an equality in two degrees' },
  { field: 'Q', statement: '[6] = [2] + [3]', shows: 'a term is missing' },
  { field: 'F_9', statement: '[z][z+1] = 0', shows: 'two units of a finite field' },
  { field: 'any', statement: '[a][b] = [a+b][-b/a]', shows: 'letters, over every field' },
  { field: 'any', statement: '[a][1+a+a^2] = 0', shows: 'a counterexample' },
  { field: 'F_7(t)', statement: '[t^2+1][t-3][2]', shows: 'residues of rational functions' },
  { field: 'Q', statement: '[5][2] + <2>[5][3]', shows: 'an expression: its canonical form' },
  { field: 'Q', statement: '[6] = [2] + <2>[3] = [2] + [3]', shows: 'a chain, step by step' },
];
