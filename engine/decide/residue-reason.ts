import type { ResidueClass } from '../ring/residue-class-ring';

/** Why two different classes of K^MW_m of a finite field differ, as a sentence; `where` reads "modulo 7". */
export function residueReason(
  degree: number,
  left: ResidueClass<unknown> | undefined,
  right: ResidueClass<unknown> | undefined,
  where: string,
): string {
  const [l, r] = [left?.rank ?? 0, right?.rank ?? 0];
  if (degree === 1) return `The two units differ ${where}.`;
  if (degree === 0 && l !== r) return `The ranks are ${l} and ${r}.`;
  if (degree === 0) return `Both have rank ${l}, but their discriminants differ by a non-square ${where}.`;
  return `They are different classes in the Witt ring ${where}.`;
}
