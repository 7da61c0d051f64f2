import type { Budget } from '../arith/budget';
import { negateInt } from '../arith/int';
import type { Expression } from '../expression/expression';
import type { Term } from '../ring/term';
import { zeroExpression } from '../ring/write-word';
import type { Open } from './decidable-field';
import type { Finding } from './finding';
import type { NumberArithmetic } from './number-arithmetic';
import type { NumberClasses, NumberUnit } from './number-classes';
import { NumberValue } from './number-value';
import { writeNumberClass } from './number-writing';
import { zeroTest, type ZeroTest } from './number-zero';
import type { MapName } from './outcome';

/** Where two classes over a number field come from: words over it, or a map at a place whose values lie `shift` degrees lower. */
export interface NumberOrigin {
  readonly map: MapName;
  readonly place?: string;
  readonly shift: number;
}

/** What was compared over a number field, and what is left open. */
export interface NumberDecision {
  readonly findings: readonly Finding[];
  readonly open: readonly Open[];
}

/**
 * Compares two classes over a number field, degree by degree: their difference is tested for zero. A degree that is not settled has no finding; it is
 * named in `open`.
 */
export function numberFindings<A, B extends NumberUnit>(
  origin: NumberOrigin,
  classes: NumberClasses<A, B>,
  arithmetic: NumberArithmetic,
  budget: Budget,
): NumberDecision {
  const [left = [], right = []] = classes.sides;
  const valueOf = (terms: readonly Term<A>[]): NumberValue<A, B> => new NumberValue(classes, arithmetic, terms, budget);
  const difference = valueOf([...left, ...right.map(negated)]);
  const written = [left, right].map(valueOf);
  const findings: Finding[] = [];
  const open: Open[] = [];
  for (const own of classes.degrees([...left, ...right])) {
    const test = zeroTest(difference, own, arithmetic);
    const write = (side: 0 | 1): Expression => writeNumberClass(written[side]!, own, classes, arithmetic);
    if (test.zero !== undefined) {
      const bothZero = (): boolean => test.zero === true && zeroTest(written[0]!, own, arithmetic).zero === true;
      findings.push(new NumberFinding(origin, own, classes.field.tex, test, bothZero, write));
    }
    if (test.zero === undefined || test.modEta === undefined || test.modH === undefined)
      open.push({
        degree: own + origin.shift,
        verdict: test.zero === undefined,
        modEta: test.modEta === undefined,
        modH: test.modH === undefined,
        missing: `K_2 of ${classes.field.name}${origin.place === undefined ? '' : `, the residue field at ${origin.place}`}`,
      });
  }
  return { findings, open };
}

export const negated = <A>(term: Term<A>): Term<A> => ({ ...term, coefficient: negateInt(term.coefficient) });

/** Two classes of K^MW_own(L) that were compared; a class, so that what is only shown is worked out on demand. */
class NumberFinding implements Finding {
  constructor(
    private readonly origin: NumberOrigin,
    private readonly own: number,
    private readonly fieldTex: string,
    private readonly test: ZeroTest,
    private readonly bothZero: () => boolean,
    private readonly write: (side: 0 | 1) => Expression,
  ) {}

  get map(): MapName {
    return this.origin.map;
  }
  get place(): string | undefined {
    return this.origin.place;
  }
  get degree(): number {
    return this.own + this.origin.shift;
  }
  get same(): boolean {
    return this.test.zero === true;
  }
  get zero(): boolean {
    return this.bothZero();
  }
  get sameModEta(): boolean {
    return this.test.modEta !== false;
  }
  get sameModH(): boolean {
    return this.test.modH !== false;
  }
  left(): Expression {
    return this.zero ? zeroExpression : this.write(0);
  }
  right(): Expression {
    return this.zero ? zeroExpression : this.write(1);
  }
  target(): string {
    return `K^{\\mathrm{MW}}_{${this.own}}(${this.fieldTex})`;
  }
  reason(): string {
    if (this.test.modEta === false && this.own === 0) return 'Their ranks differ.';
    if (this.test.modEta === false && this.own === 1) return 'The products of the entries are different numbers.';
    if (this.test.modH === false) return 'They are different classes in the Witt ring.';
    return 'Their symbols differ in Milnor K-theory.';
  }
}
