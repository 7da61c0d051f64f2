import { listed } from './phrase';

const signed = (degree: number): string => (degree < 0 ? `−${-degree}` : String(degree));

export const degreeName = (degree: number): string => `degree ${signed(degree)}`;

/** "degree 2", "degrees 2 and 0": for one short phrase. */
export const degreesName = (degrees: readonly number[]): string =>
  degrees.length === 1 ? degreeName(degrees[0] ?? 0) : `degrees ${listed(degrees.map(signed))}`;

/** "in degree 2 and in degree 0": how a sentence begins that finishes a verdict. */
export const inDegrees = (degrees: readonly number[]): string =>
  listed(degrees.map((degree) => `in ${degreeName(degree)}`));

/** What the part of a degree is, by the structure of Milnor–Witt K-theory (Morel, LNM 2052, chapter 3). */
export function degreeMeaning(degree: number): string {
  if (degree === 0) return 'classes of quadratic forms';
  if (degree < 0) return 'forms up to hyperbolic planes';
  if (degree === 1) return 'units paired with forms of even rank';
  return 'Milnor symbols paired with a power of the fundamental ideal';
}
