import type { GradedRing } from './graded-ring';

/** A ring whose entries are named by places in a list; symbols and angles are worked out once for each. */
export function tabledRing<A, H>(ring: GradedRing<A, H>, entryAt: (place: number) => A): GradedRing<number, H> {
  const tabled = (make: (entry: A) => H | undefined): ((place: number) => H | undefined) => {
    const known = new Map<number, H | undefined>();
    return (place) => {
      if (!known.has(place)) known.set(place, make(entryAt(place)));
      return known.get(place);
    };
  };
  return { ...ring, symbol: tabled(ring.symbol), angle: tabled(ring.angle) };
}
