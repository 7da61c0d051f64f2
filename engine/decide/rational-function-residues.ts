import type { Budget } from '../arith/budget';
import type { Int } from '../arith/int';
import { integerElement, letterElement, quotientElement, type Element } from '../expression/element';
import { Refusal } from '../expression/refusal';
import { elementText } from '../expression/to-text';
import { factorOverRationals } from '../field/factor-rational';
import { degree as degreeOf, type Polynomial } from '../field/polynomial';
import { rationals, type Rational } from '../field/rational';
import { writePolynomial } from '../field/write-polynomial';
import type { FunctionEntry } from '../place/function-entry';
import { reductionsAt, reductionsAtInfinity, type Reductions } from '../place/reduced-entry';
import { degreesOf } from '../ring/degrees';
import type { Term } from '../ring/term';
import { total, zeroExpression } from '../ring/write-word';
import { checkOnePlace, noUniformizer, readFunctionPlaces, type AskedPlace } from './asked-place';
import { residueClasses, specialisationClasses } from './function-classes';
import { numberPlaces } from './function-number-classes';
import type { FunctionStatement } from './function-statement';
import { NumberArithmetic } from './number-arithmetic';
import type { NumberClasses, NumberUnit } from './number-classes';
import { NumberValue } from './number-value';
import { writeNumberClass } from './number-writing';
import { zeroTest } from './number-zero';
import type { Residue, ResiduesOutcome } from './outcome';
import { rationalFindings } from './rational-findings';
import { writtenOverRationals } from './rational-writing';
import { unitReader } from './read-unit';

type Terms = readonly Term<FunctionEntry<Rational>>[];

/** The index of a place among those in sight, or infinity. */
type Placed = number | 'infinity';

/**
 * Residue and specialisation of a class of K^MW_*(ℚ(t)) at the places asked for or at every place where it ramifies, infinity included.
 * Uniformizers by default: P, and 1/t at infinity. Against uπ in place of π the residue is multiplied by ⟨ū⟩ (F. Morel, LNM 2052, ch. 3). A
 * `uniformizer` goes with exactly one place. Where it cannot be told whether a residue is zero that is refused (`not-yet`).
 */
export function rationalFunctionResidues(
  statement: FunctionStatement<Rational>,
  asked: readonly AskedPlace[] | undefined,
  uniformizer: Element | undefined,
  budget: Budget,
): ResiduesOutcome {
  const { functions, sight } = statement;
  const inSight: readonly Placed[] = [...statement.order(), 'infinity'];
  const residues = new RationalFunctionResidues(statement, budget);
  if (asked === undefined) {
    if (uniformizer !== undefined) checkOnePlace(undefined, uniformizer);
    const ramified = inSight.filter((place) => !residues.isZero(place));
    return { residues: ramified.map((place) => residues.at(place)), unramifiedElsewhere: true };
  }
  const factor = (f: Polynomial<Rational>) => factorOverRationals(f, budget).factors;
  const places = readFunctionPlaces(functions, asked, factor, budget).map((place): Placed =>
    place === 'infinity' ? place : sight.index(place),
  );
  if (uniformizer !== undefined) checkOnePlace(places.length, uniformizer);
  const listed = new Set(places);
  return {
    residues: places.map((place) => residues.at(place, uniformizer)),
    unramifiedElsewhere: inSight.every((place) => listed.has(place) || residues.isZero(place)),
  };
}

class RationalFunctionResidues {
  private readonly terms: Terms;

  constructor(
    private readonly statement: FunctionStatement<Rational>,
    private readonly budget: Budget,
  ) {
    this.terms = statement.sides[0] ?? [];
  }

  isZero(place: Placed): boolean {
    const { statement, budget } = this;
    const ramified = place === 'infinity' ? this.terms : statement.terms(0, place);
    if (!this.isNumberPlace(place)) {
      const classes = residueClasses([ramified, []], this.reductions(place));
      return rationalFindings(classes, budget).every(({ same }) => same);
    }
    const classes = numberPlaces(statement, budget).residues([ramified], place);
    const arithmetic = new NumberArithmetic(classes.field, classes.generators, budget);
    const value = new NumberValue(classes, arithmetic, ramified, budget);
    return classes.degrees(ramified).every((own) => this.settled(zeroTest(value, own, arithmetic).zero, place));
  }

  at(place: Placed, typed?: Element): Residue {
    const { statement, budget } = this;
    const value = typed && unitReader(statement.written, budget)(typed);
    const parameter = value && statement.sight.entry(value, typed.at);
    if (typed !== undefined && parameter !== undefined) this.checkUniformizer(place, typed, parameter);
    const uniformizer = value === undefined ? this.uniformizer(place) : statement.written.write(value);
    return this.isNumberPlace(place)
      ? this.overNumberField(place, uniformizer, parameter)
      : this.overRationals(place, uniformizer, parameter);
  }

  private isNumberPlace(place: Placed): place is number {
    return place !== 'infinity' && degreeOf(this.statement.sight.places[place]!) > 1;
  }

  private reductions(place: Placed, parameter?: Rational): Reductions {
    return place === 'infinity'
      ? reductionsAtInfinity(parameter)
      : reductionsAt(this.statement.sight.places, place, parameter);
  }

  private uniformizer(place: Placed): Element {
    const { functions, sight } = this.statement;
    return place === 'infinity'
      ? quotientElement(integerElement(1n), letterElement(functions.generator))
      : writePolynomial(rationals, sight.places[place]!, functions.generator);
  }

  private nameOf(place: Placed): string {
    return place === 'infinity' ? place : elementText(this.uniformizer(place));
  }

  private checkUniformizer(place: Placed, typed: Element, { degree, exponents }: FunctionEntry<Rational>): void {
    let valuation: Int = place === 'infinity' ? -degree : 0;
    for (let i = 0; i < exponents.length; i += 2) if (exponents[i] === place) valuation = exponents[i + 1] ?? 0;
    if (valuation !== 1)
      throw noUniformizer(typed, `${valuation}`, this.nameOf(place), elementText(this.uniformizer(place)));
  }

  private overRationals(place: Placed, uniformizer: Element, parameter?: FunctionEntry<Rational>): Residue {
    const { terms, budget } = this;
    const w = parameter && this.reductions(place).at(parameter).rational.value;
    const classes = residueClasses([terms, []], this.reductions(place, w));
    const findings = rationalFindings(classes, budget);
    const ramified = new Set(findings.filter(({ same }) => !same).map(({ degree }) => degree));
    const residue = writtenOverRationals(classes, 0, budget).filter(({ degree }) => ramified.has(degree));
    const special = writtenOverRationals(specialisationClasses([terms], this.reductions(place, w)), 0, budget);
    return {
      place: this.nameOf(place),
      residueField: rationals.name,
      uniformizer,
      value: total(residue.map(({ normalForm }) => normalForm)),
      degree: residue[0]?.degree ?? this.topDegree() - 1,
      zero: residue.length === 0,
      specialisation: total(special.map(({ normalForm }) => normalForm)),
    };
  }

  private overNumberField(place: number, uniformizer: Element, parameter?: FunctionEntry<Rational>): Residue {
    const { terms, budget, statement } = this;
    const numbers = numberPlaces(statement, budget);
    const residue = this.written(numbers.residues([terms], place, parameter), place, true);
    const special = this.written(numbers.specialisations([terms], place, parameter), place, false);
    return {
      place: this.nameOf(place),
      residueField: residue.field,
      uniformizer,
      value: residue.value,
      degree: residue.top ?? this.topDegree() - 1,
      zero: residue.top === undefined,
      specialisation: special.value,
    };
  }

  /** A class over a number field, and the highest degree in which it is not zero where that is asked for. */
  private written<A extends FunctionEntry<Rational>, B extends NumberUnit>(
    classes: NumberClasses<A, B>,
    place: number,
    tested: boolean,
  ): { readonly field: string; readonly value: Residue['value']; readonly top: number | undefined } {
    const { budget } = this;
    const { field } = classes;
    const terms = classes.sides[0] ?? [];
    const arithmetic = new NumberArithmetic(field, classes.generators, budget);
    const value = new NumberValue(classes, arithmetic, terms, budget);
    let top: number | undefined;
    const words = classes.degrees(terms).map((own) => {
      const zero = tested && this.settled(zeroTest(value, own, arithmetic).zero, place);
      if (!zero) top ??= own;
      return zero ? zeroExpression : writeNumberClass(value, own, classes, arithmetic);
    });
    return { field: field.name, value: total(words), top };
  }

  private topDegree(): number {
    return degreesOf(this.terms)[0] ?? 0;
  }

  private settled(zero: boolean | undefined, place: Placed): boolean {
    if (zero !== undefined) return zero;
    throw new Refusal(
      'not-yet',
      `The residue at ${this.nameOf(place)} lies in K^MW_2 of a number field, and whether it is zero there is not decided yet. Name another place.`,
    );
  }
}
