import type { ComparedMap } from '@/lib/contracts/compare';

type MapName = ComparedMap['map'];

/** What a homomorphism is called in a table. */
export const mapWord: Record<MapName, string> = {
  rank: 'rank',
  signature: 'signature',
  residue: 'residue',
  specialisation: 'specialisation',
  product: 'product of the entries',
  symbol: 'norm residue symbol',
  discriminant: 'discriminant',
  hasse: 'Hasse invariant',
  class: 'the class itself',
  word: 'canonical word',
};

/** What it contributes to a comparison, in a sentence that says why the comparison is complete. */
const contribution: Record<MapName, string> = {
  rank: 'the rank',
  signature: 'the part at the real place',
  residue: 'the residue at every prime in sight',
  specialisation: 'the specialisation',
  product: 'the product of the entries',
  symbol: 'the norm residue symbol',
  discriminant: 'the discriminant',
  hasse: 'the Hasse invariant',
  class: 'the class in closed form',
  word: 'the canonical word of each side',
};

/** "the part at the real place, and the residue at every prime in sight". */
export function contributions(maps: readonly MapName[]): string {
  // The rank is part of what the real place sees.
  const parts = (Object.keys(contribution) as MapName[])
    .filter((map) => maps.includes(map) && !(map === 'rank' && maps.includes('signature')))
    .map((map) => contribution[map]);
  const last = parts.at(-1) ?? '';
  return parts.length < 2 ? last : `${parts.slice(0, -1).join(', ')}, and ${last}`;
}

/** How a place is written over a tile: ∞ for the real place and that of degree −1, a prime by its digits, a polynomial set. */
export const placeTex = (place: string): string =>
  place === 'real' || place === 'infinity' ? '\\infty' : place.replaceAll('*', '').replace(/\^(\d{2,})/g, '^{$1}');

export const placeWords = (place: string): string =>
  place === 'real' ? 'the real place' : place === 'infinity' ? 'infinity' : place;
