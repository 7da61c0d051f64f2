import type { Expression } from '../expression/expression';
import type { MapName } from './outcome';

/**
 * One homomorphism applied to both sides in one degree. What is shown is written only when it is asked for, since a decision
 * needs only `same`.
 */
export interface Finding {
  readonly map: MapName;
  readonly place?: string;
  readonly degree: number;
  readonly same: boolean;
  readonly zero: boolean;
  /** Whether the values agree modulo η, that is in Milnor K-theory. */
  readonly sameModEta: boolean;
  /** Whether the values agree modulo h, that is in the Witt ring. */
  readonly sameModH: boolean;
  left(): Expression;
  right(): Expression;
  /** The group of the values, in TeX. */
  target(): string;
  /** Why two different values differ, as a whole sentence. */
  reason(): string;
}
