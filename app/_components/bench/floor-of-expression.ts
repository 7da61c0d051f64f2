import type { ComparedMap, ComparedPart } from '@/lib/contracts/compare';
import type { FloorCell, FloorPlace, FloorRow } from '../tile/floor';
import { degreeName } from './degrees';
import { mapWord, placeTex, placeWords } from './map-words';

const columnOf = (one: ComparedMap): string => one.place ?? one.map;

/** ∞ first, then the primes ascending, then maps that belong to no place, as they come. */
function order(a: ComparedMap, b: ComparedMap): number {
  const rank = (one: ComparedMap) =>
    one.place === 'real' || one.place === 'infinity' ? 0 : one.place === undefined ? 2 : 1;
  if (rank(a) !== rank(b)) return rank(a) - rank(b);
  if (a.place === undefined || b.place === undefined || a.place === b.place) return 0;
  return a.place.length - b.place.length || (a.place < b.place ? -1 : 1);
}

function cellOf(degree: number, column: string, compared: readonly ComparedMap[]): FloorCell | undefined {
  const here = compared.filter((one) => columnOf(one) === column);
  const shown = here.find((one) => one.left.text !== '0') ?? here[0];
  if (!shown) return undefined;
  const zero = here.every((one) => one.left.text === '0');
  const at = shown.place === undefined ? mapWord[shown.map] : `at ${placeWords(shown.place)}`;
  return {
    key: `${degree}:${column}`,
    name: `${at.charAt(0).toUpperCase()}${at.slice(1)}, ${degreeName(degree)}: ${zero ? '0' : shown.left.text}`,
    state: zero ? 'none' : 'solid',
    left: shown.left,
  };
}

/** The floor of one expression: what each invariant is on it, from its comparison with zero. */
export function floorOfExpression(parts: readonly ComparedPart[]): { places: FloorPlace[]; rows: FloorRow[] } {
  const seen = new Map<string, ComparedMap>();
  for (const part of parts) for (const one of part.compared) if (!seen.has(columnOf(one))) seen.set(columnOf(one), one);
  const columns = [...seen.values()].sort(order);
  return {
    places: columns.map((one) =>
      one.place === undefined ? { key: one.map, word: mapWord[one.map] } : { key: one.place, tex: placeTex(one.place) },
    ),
    rows: parts.map((part) => ({
      degree: part.degree,
      cells: columns.map((one) => cellOf(part.degree, columnOf(one), part.compared)),
    })),
  };
}
