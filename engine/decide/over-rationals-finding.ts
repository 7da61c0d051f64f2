import type { Expression } from '../expression/expression';
import { zeroExpression } from '../ring/write-word';
import type { Finding } from './finding';
import type { MapName } from './outcome';

/** The canonical form over ℚ of a side of what is compared, in this degree. */
export type WriteSide = (side: 0 | 1, degree: number) => Expression;

/** Where two classes of K^MW_*(ℚ) come from: a map at a place of ℚ(t), whose values lie `shift` degrees lower. */
export interface OverRationals {
  readonly map: MapName;
  readonly place: string;
  readonly shift: number;
  readonly write: WriteSide;
}

/** Puts what decides over ℚ together, one finding for each degree of the statement; written on demand. */
export function overRationals(origin: OverRationals, parts: readonly Finding[]): readonly Finding[] {
  const byDegree = new Map<number, Finding[]>();
  for (const part of parts) {
    const here = byDegree.get(part.degree);
    if (here === undefined) byDegree.set(part.degree, [part]);
    else here.push(part);
  }
  return [...byDegree].map(([own, here]) => new OverRationalsFinding(origin, own, here));
}

class OverRationalsFinding implements Finding {
  constructor(
    private readonly origin: OverRationals,
    private readonly own: number,
    private readonly parts: readonly Finding[],
  ) {}

  get map(): MapName {
    return this.origin.map;
  }
  get place(): string {
    return this.origin.place;
  }
  get degree(): number {
    return this.own + this.origin.shift;
  }
  get same(): boolean {
    return this.parts.every(({ same }) => same);
  }
  get zero(): boolean {
    return this.parts.every(({ zero }) => zero);
  }
  get sameModEta(): boolean {
    return this.parts.every(({ sameModEta }) => sameModEta);
  }
  get sameModH(): boolean {
    return this.parts.every(({ sameModH }) => sameModH);
  }
  left(): Expression {
    return this.written(0);
  }
  right(): Expression {
    return this.written(1);
  }
  target(): string {
    return `K^{\\mathrm{MW}}_{${this.own}}(\\mathbb{Q})`;
  }
  reason(): string {
    const part = this.parts.find(({ same }) => !same);
    if (part === undefined) return '';
    const { place } = part;
    const where = place === undefined ? '' : place === 'real' ? ', at the real place' : `, at ${place}`;
    const reason = part.reason();
    return `Over Q${where}: ${reason.charAt(0).toLowerCase()}${reason.slice(1)}`;
  }
  private written(side: 0 | 1): Expression {
    return this.zero ? zeroExpression : this.origin.write(side, this.own);
  }
}
