import type { ResidueClass } from './residue-class-ring';

/** One word c·η^eta·[symbol] or c·η^eta·⟨angle⟩ of the canonical form of a class of K^MW_*(𝔽_q). */
export interface ResidueWord<E> {
  readonly coefficient: bigint;
  readonly eta: number;
  readonly symbol?: E;
  readonly angle?: E;
}

/**
 * The canonical form of a class of K^MW_m(𝔽_q) with s the least non-square. m = 1: [u]. m = 0: n, or (n−1) + ⟨s⟩.
 * m = −k: j·ηᵏ with 0 ≤ j ≤ 3 if q ≡ 3 mod 4; 0, ηᵏ, ηᵏ⟨s⟩ or ηᵏ + ηᵏ⟨s⟩ if q ≡ 1 mod 4; 0 or ηᵏ if q is even.
 */
export function residueWords<E>(
  degree: number,
  value: ResidueClass<E> | undefined,
  { nonSquare, orderModFour }: { readonly nonSquare: E | undefined; readonly orderModFour: 1 | 2 | 3 },
): readonly ResidueWord<E>[] {
  if (value === undefined) return [];
  if (value.unit !== undefined) return [{ coefficient: 1n, eta: 0, symbol: value.unit }];
  const eta = degree < 0 ? -degree : 0;
  if (value.squareClass === 0 || nonSquare === undefined) return [{ coefficient: BigInt(value.rank), eta }];
  // in W(𝔽_q) with q ≡ 1 mod 4 the class of rank 0 is ⟨1⟩ + ⟨s⟩, for 2 = 0 there
  const plain = degree < 0 && orderModFour === 1 && value.rank === 0 ? 1n : BigInt(value.rank) - 1n;
  const twisted: ResidueWord<E> = { coefficient: 1n, eta, angle: nonSquare };
  return plain === 0n ? [twisted] : [{ coefficient: plain, eta }, twisted];
}
