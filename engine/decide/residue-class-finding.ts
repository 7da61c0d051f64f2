import type { Expression } from '../expression/expression';
import type { FiniteField } from '../field/field';
import { differenceIn, residueGroupTex, zeroModEta, zeroModH } from '../ring/residue-class-quotients';
import { residueClassRing, type ResidueClass, type UnitGroup } from '../ring/residue-class-ring';
import { writeResidueClass } from '../ring/write-residue-class';
import type { Finding } from './finding';
import type { MapName } from './outcome';
import { residueReason } from './residue-reason';

/** Where two classes come from that are compared over a finite field. */
export interface ClassOrigin<E> {
  readonly map: MapName;
  readonly place?: string;
  readonly field: FiniteField<E>;
  readonly units: UnitGroup<E>;
  /** Where they differ, in a sentence: `modulo t+1`. */
  readonly where: string;
}

/** Two classes of K^MW_own over a finite field compared, found in this degree of the statement; written on demand. */
export class ResidueClassFinding<E> implements Finding {
  private readonly difference: ResidueClass<E> | undefined;

  constructor(
    private readonly origin: ClassOrigin<E>,
    readonly degree: number,
    private readonly own: number,
    private readonly x: ResidueClass<E> | undefined,
    private readonly y: ResidueClass<E> | undefined,
  ) {
    this.difference = differenceIn(residueClassRing(origin.units), own, x, y);
  }

  get map(): MapName {
    return this.origin.map;
  }
  get place(): string | undefined {
    return this.origin.place;
  }
  get same(): boolean {
    return this.difference === undefined;
  }
  get zero(): boolean {
    return this.x === undefined && this.y === undefined;
  }
  get sameModEta(): boolean {
    return zeroModEta(this.own, this.difference);
  }
  get sameModH(): boolean {
    return zeroModH(this.difference, this.origin.units.classOfMinusOne);
  }
  left(): Expression {
    return writeResidueClass(this.origin.field, this.own, this.x);
  }
  right(): Expression {
    return writeResidueClass(this.origin.field, this.own, this.y);
  }
  target(): string {
    return residueGroupTex(this.origin.field.tex, this.own);
  }
  reason(): string {
    return residueReason(this.own, this.x, this.y, this.origin.where);
  }
}
