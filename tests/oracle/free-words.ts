import type { Element } from '@/engine/expression/element';
import type { Expression } from '@/engine/expression/expression';

/** coefficient · η^eta · [e₁][e₂]…, with η moved to the front: η[a] = [a]η. */
export interface FreeWord<E> {
  readonly coefficient: bigint;
  readonly eta: number;
  readonly entries: readonly E[];
}

/** More words than this are a mistake of the test that made them. */
const MOST = 200_000;

/**
 * Multiplies an expression out in the free ring on η and the symbols, by the definitions of ⟨a⟩, ⟪a⟫, h, ε and n_ε alone:
 * no relation but that η is central. Exponential, and meant to be: the slow road.
 */
export function freeWords<E>(node: Expression, read: (entry: Element) => E, minusOne: E): readonly FreeWord<E>[] {
  const one: FreeWord<E> = { coefficient: 1n, eta: 0, entries: [] };
  const scaled = (words: readonly FreeWord<E>[], c: bigint): readonly FreeWord<E>[] =>
    words.map((word) => ({ ...word, coefficient: c * word.coefficient }));
  const product = (factors: readonly (readonly FreeWord<E>[])[]): readonly FreeWord<E>[] =>
    factors.reduce<readonly FreeWord<E>[]>(
      (left, right) => {
        if (left.length * right.length > MOST) throw new RangeError('too many words for the slow road');
        return left.flatMap((x) =>
          right.map((y) => ({
            coefficient: x.coefficient * y.coefficient,
            eta: x.eta + y.eta,
            entries: [...x.entries, ...y.entries],
          })),
        );
      },
      [one],
    );
  const etaSymbol = (entry: E, c: bigint): FreeWord<E> => ({ coefficient: c, eta: 1, entries: [entry] });
  const form = (entry: E): readonly FreeWord<E>[] => [one, etaSymbol(entry, 1n)];

  const walk = (e: Expression): readonly FreeWord<E>[] => {
    switch (e.kind) {
      case 'integer':
        return scaled([one], e.value);
      case 'symbol':
        return [{ ...one, entries: e.entries.map(read) }];
      case 'angle':
        return e.entries.flatMap((entry) => form(read(entry)));
      case 'pfister':
        return product(e.entries.map((entry) => [etaSymbol(read(entry), -1n)]));
      case 'eta':
        return [{ ...one, eta: 1 }];
      case 'hyperbolic':
        return [...scaled([one], 2n), etaSymbol(minusOne, 1n)];
      case 'epsilon':
        return scaled(form(minusOne), -1n);
      case 'epsilonInteger': {
        // n_ε is ⟨1⟩ + ⟨−1⟩ + ⟨1⟩ + …, n summands in turn; for n < 0 it is −⟨−1⟩ times that of −n
        const size = e.count < 0n ? -e.count : e.count;
        const words: FreeWord<E>[] = [];
        for (let i = 0n; i < size; i += 1n) words.push(...(i % 2n === 0n ? [one] : form(minusOne)));
        return e.count < 0n ? product([scaled(form(minusOne), -1n), words]) : words;
      }
      case 'negate':
        return scaled(walk(e.of), -1n);
      case 'sum':
        return e.terms.flatMap(walk);
      case 'product':
        return product(e.factors.map(walk));
      case 'power':
        return product(Array.from({ length: e.exponent }, () => walk(e.base)));
    }
  };
  return walk(node);
}

/** The words of left − right by degree. */
export function differenceByDegree<E>(
  left: readonly FreeWord<E>[],
  right: readonly FreeWord<E>[],
): ReadonlyMap<number, readonly FreeWord<E>[]> {
  const byDegree = new Map<number, FreeWord<E>[]>();
  const negated = right.map((word) => ({ ...word, coefficient: -word.coefficient }));
  for (const word of [...left, ...negated]) {
    const degree = word.entries.length - word.eta;
    byDegree.set(degree, [...(byDegree.get(degree) ?? []), word]);
  }
  return byDegree;
}
