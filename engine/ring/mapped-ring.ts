import type { GradedRing } from './graded-ring';

/** A graded ring read through a map of entries: [a] ↦ [f(a)]. The image of an entry is asked for once. */
export function mappedRing<A extends object, B, H>(ring: GradedRing<B, H>, f: (entry: A) => B): GradedRing<A, H> {
  const images = new Map<A, { readonly symbol: H | undefined; readonly angle: H | undefined }>();
  const image = (entry: A): { readonly symbol: H | undefined; readonly angle: H | undefined } => {
    const known = images.get(entry);
    if (known !== undefined) return known;
    const unit = f(entry);
    const made = { symbol: ring.symbol(unit), angle: ring.angle(unit) };
    images.set(entry, made);
    return made;
  };
  return {
    integer: (n) => ring.integer(n),
    symbol: (entry) => image(entry).symbol,
    angle: (entry) => image(entry).angle,
    eta: (power) => ring.eta(power),
    add: (degree, x, y) => ring.add(degree, x, y),
    negate: (degree, x) => ring.negate(degree, x),
    multiply: (m, x, n, y) => ring.multiply(m, x, n, y),
    equal: (degree, x, y) => ring.equal(degree, x, y),
  };
}
