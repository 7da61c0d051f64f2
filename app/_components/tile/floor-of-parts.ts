import type { ComparedMap, ComparedPart } from '@/lib/contracts/compare';
import { placeTex } from '../bench/map-words';
import type { FloorCell, FloorPlace, FloorRow } from './floor';
import type { TileState } from './tile';

const mapWords: Record<ComparedMap['map'], string> = {
  rank: 'rank',
  signature: 'signature',
  residue: 'residue',
  specialisation: 'special value',
  product: 'product',
  symbol: 'symbol',
  discriminant: 'discri\u00adminant',
  hasse: 'Hasse',
  class: 'class',
  word: 'word',
};

const placeKey = (entry: ComparedMap) => entry.place ?? `map:${entry.map}`;

/** ∞ first, then the primes by size, then what belongs to no place in the order it came. */
function rank(key: string): [number, bigint] {
  if (key === 'real' || key === 'infinity') return [0, 0n];
  if (/^\d+$/.test(key)) return [1, BigInt(key)];
  return key.startsWith('map:') ? [3, 0n] : [2, 0n];
}

function columnOf(key: string): FloorPlace {
  if (key.startsWith('map:')) return { key, word: mapWords[key.slice(4) as ComparedMap['map']] };
  return { key, tex: placeTex(key) };
}

function stateOf(entries: readonly ComparedMap[]): TileState {
  if (entries.some((entry) => !entry.same)) return 'split';
  return entries.every((entry) => entry.zero) ? 'agree' : 'whole';
}

function cellOf(degree: number, key: string, entries: readonly ComparedMap[]): FloorCell {
  const state = stateOf(entries);
  const shown = entries.find((entry) => !entry.same) ?? entries.find((entry) => !entry.zero) ?? entries[0];
  const where = key === 'real' ? 'At the real place' : key.startsWith('map:') ? `By ${key.slice(4)}` : `At ${key}`;
  const both =
    entries.length > 1 ? entries.map((entry) => `${entry.map} ${entry.left.text}`).join(', ') : shown?.left.text;
  const what =
    state === 'split'
      ? `left ${shown?.left.text}, right ${shown?.right.text}`
      : state === 'agree'
        ? 'both sides 0'
        : `both sides ${both}`;
  return {
    key: `${degree}:${key}`,
    name: `${where}, degree ${degree}: ${what}`,
    state,
    left: shown?.left,
    right: shown?.right,
  };
}

/** The floor of a comparison: one column a place (or a map that belongs to none), one row a degree. */
export function floorOfComparison(parts: readonly ComparedPart[]): { places: FloorPlace[]; rows: FloorRow[] } {
  const keys = [...new Set(parts.flatMap((part) => part.compared.map(placeKey)))].sort((a, b) => {
    const [classA, sizeA] = rank(a);
    const [classB, sizeB] = rank(b);
    return classA - classB || (sizeA < sizeB ? -1 : sizeA > sizeB ? 1 : 0);
  });
  const rows = parts.map((part) => ({
    degree: part.degree,
    cells: keys.map((key) => {
      const entries = part.compared.filter((entry) => placeKey(entry) === key);
      return entries.length === 0 ? undefined : cellOf(part.degree, key, entries);
    }),
  }));
  return { places: keys.map(columnOf), rows };
}
