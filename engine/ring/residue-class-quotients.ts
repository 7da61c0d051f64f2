import { moduloFour, xorInt, type Int } from '../arith/int';
import type { GradedRing } from './graded-ring';
import type { ResidueClass } from './residue-class-ring';

/** x − y in one degree, `undefined` for 0. */
export function differenceIn<A, H>(
  ring: GradedRing<A, H>,
  degree: number,
  x: H | undefined,
  y: H | undefined,
): H | undefined {
  if (y === undefined) return x;
  const minus = ring.negate(degree, y);
  return x === undefined || minus === undefined ? (x ?? minus) : ring.add(degree, x, minus);
}

/** Whether a class of K^MW_m of a finite field is zero modulo η, that is in Milnor K-theory. */
export const zeroModEta = (degree: number, x: ResidueClass<unknown> | undefined): boolean =>
  x === undefined || (x.unit === undefined && (degree < 0 || x.rank === 0));

/** Whether a class of K^MW_m of a finite field is zero modulo h, that is in the Witt ring: even rank and trivial signed discriminant. */
export function zeroModH(x: ResidueClass<unknown> | undefined, classOfMinusOne: Int): boolean {
  if (x === undefined) return true;
  const rank = moduloFour(x.rank);
  return rank % 2 === 0 && xorInt(x.squareClass, rank === 2 ? classOfMinusOne : 0) === 0;
}

/** K^MW_m of a field in TeX, as it is known over a finite field. */
export function residueGroupTex(fieldTex: string, degree: number): string {
  if (degree > 1) return '0';
  if (degree === 1) return `${fieldTex}^{\\times}`;
  return `\\mathrm{${degree === 0 ? 'GW' : 'W'}}(${fieldTex})`;
}
