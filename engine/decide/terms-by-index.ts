import type { Int } from '../arith/int';
import { forEachEntry, type Term } from '../ring/term';

/**
 * Sorts terms by the places, `size` of them, at which they ramify: counted first, so that one list holds them all. Places past these
 * have none. `exponentsOf` gives the index of a place and the exponent of an entry there, in turn.
 */
export function termsByIndex<A>(
  side: readonly Term<A>[],
  size: number,
  exponentsOf: (entry: A) => readonly Int[],
): (index: number) => readonly Term<A>[] {
  const forEachRamified = (visit: (term: Term<A>, index: number) => void): void => {
    const last = new Array<Term<A> | undefined>(size).fill(undefined);
    let term: Term<A>;
    const atEntry = (entry: A): void => {
      const exponents = exponentsOf(entry);
      for (let i = 0; i < exponents.length; i += 2) {
        const index = Number(exponents[i]);
        if (last[index] !== term) visit(term, index);
        last[index] = term;
      }
    };
    for (term of side) forEachEntry(term, atEntry);
  };
  // where the terms of an index begin and end; while they are counted, shifted by one
  const starts = new Uint32Array(size + 1);
  forEachRamified((_, index) => (starts[index + 1] = (starts[index + 1] ?? 0) + 1));
  for (let i = 1; i <= size; i += 1) starts[i] = (starts[i] ?? 0) + (starts[i - 1] ?? 0);
  const sorted = new Array<Term<A>>(starts[size] ?? 0);
  const next = starts.slice();
  forEachRamified((term, index) => {
    const at = next[index] ?? 0;
    next[index] = at + 1;
    sorted[at] = term;
  });
  return (index) => (index < size ? sorted.slice(starts[index], starts[index + 1]) : []);
}
