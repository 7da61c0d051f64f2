import type { Element } from '../expression/element';
import { angle, type Expression } from '../expression/expression';
import type { ResidueClass } from './residue-class-ring';
import { etaFactors, multiple, symbolFactors, total, zeroExpression } from './write-word';

/** How the elements of a finite field are written: a unit, and the least non-square (`undefined` in characteristic 2). */
export interface UnitWriter<E> {
  write(unit: E): Element;
  readonly nonSquare: Element | undefined;
  /** q mod 4, 2 in characteristic 2. */
  readonly orderModFour: 1 | 2 | 3;
}

/**
 * The canonical form of a class of K^MW_*(𝔽_q) with s the least non-square. Degree 1: [u]. Degree 0: n or (n−1) + ⟨s⟩.
 * Degree −k: j·ηᵏ with 0 ≤ j ≤ 3 if q ≡ 3 mod 4; 0, ηᵏ, ηᵏ⟨s⟩ or ηᵏ + ηᵏ⟨s⟩ if q ≡ 1 mod 4; 0 or ηᵏ if q is even.
 * `prefix` is put in front of every word.
 */
export function writeResidueClass<E>(
  degree: number,
  value: ResidueClass<E> | undefined,
  writer: UnitWriter<E>,
  prefix: readonly Expression[] = [],
): Expression {
  if (value === undefined) return zeroExpression;
  const word = (c: bigint, factors: readonly Expression[]): readonly Expression[] =>
    c === 0n ? [] : [multiple(c, [...etaFactors(degree < 0 ? -degree : 0), ...prefix, ...factors])];
  if (value.unit !== undefined) return total(word(1n, symbolFactors(writer.write(value.unit), 1)));
  const twisted = value.squareClass !== 0n && writer.nonSquare !== undefined;
  if (!twisted) return total(word(value.rank, []));
  const s = angle([writer.nonSquare]);
  // in W(𝔽_q) with q ≡ 1 mod 4 the class of rank 0 is ⟨1⟩ + ⟨s⟩, for 2 = 0 there
  const plain = degree < 0 && writer.orderModFour === 1 && value.rank === 0n ? 1n : value.rank - 1n;
  return total([...word(plain, []), ...word(1n, [s])]);
}
