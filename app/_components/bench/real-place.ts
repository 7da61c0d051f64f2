import type { ComparedPart } from '@/lib/contracts/compare';

/**
 * For the floor alone: where there is a real place, the rank stands there beside the signature, since together they are the part of
 * a class that no prime sees.
 */
export function withRankAtReal(parts: readonly ComparedPart[]): readonly ComparedPart[] {
  if (!parts.some((part) => part.compared.some((one) => one.place === 'real'))) return parts;
  return parts.map((part) => ({
    ...part,
    compared: part.compared.map((one) =>
      one.map === 'rank' && one.place === undefined ? { ...one, place: 'real' } : one,
    ),
  }));
}
