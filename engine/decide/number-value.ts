import type { Budget } from '../arith/budget';
import type { Int } from '../arith/int';
import { Exhausted, limitedBudget } from '../arith/limited-budget';
import { integerElement, powerElement, productElement, type Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import { expressionRing, type Sized } from '../ring/expression-ring';
import { zeroExpression } from '../ring/write-word';
import type { Graded } from '../ring/graded-ring';
import { productRing, type ProductClass } from '../ring/product-ring';
import { residueRing } from '../ring/residue-ring';
import { rankRing, signatureRing } from '../ring/signature-ring';
import type { Term } from '../ring/term';
import { mappedRing } from '../ring/mapped-ring';
import { wittSymbolRing, type WittSymbols } from '../ring/witt-symbol-ring';
import { wordRing, type Monomial, type Words } from '../ring/word-ring';
import { oddMask, type NumberArithmetic } from './number-arithmetic';
import { forEachGenerator, type NumberClasses, type NumberUnit } from './number-classes';

/** Steps that writing a class out in words may take. */
const WORD_STEPS = 2_000;

/** The images of one class over a number field, each worked out when it is asked for. */
export class NumberValue<A, B extends NumberUnit> {
  private ranks: Graded<Int> | undefined;
  private units: Graded<ProductClass> | undefined;
  private symbols: Graded<WittSymbols> | undefined;
  private signs: readonly Graded<Int>[] | undefined;
  private unsimplified: Graded<Sized> | undefined;
  private written: Graded<Words> | 'too long' | undefined;

  constructor(
    private readonly classes: NumberClasses<A, B>,
    private readonly arithmetic: NumberArithmetic,
    private readonly terms: readonly Term<A>[],
    private readonly budget: Budget,
  ) {}

  /** The rank of the part of degree 0. */
  rank(): bigint {
    const { classes, terms, budget } = this;
    this.ranks ??= classes.image(terms, residueRing<B, Int>(rankRing, classes.minusOne), budget);
    return BigInt(this.ranks.get(0) ?? 0);
  }

  /** The unit that the part of degree 1 is modulo η, as exponents of generators; the exponent of −1 is 0 or 1. */
  unit(): ReadonlyMap<number, Int> {
    const { classes, terms, budget } = this;
    this.units ??= classes.image(terms, residueRing(productRing<B>(factored), classes.minusOne), budget);
    const found = this.units.get(1);
    if (found?.kind !== 'unit') return new Map();
    return found.sign === 0 ? found.exponents : new Map([[0, 1], ...found.exponents]);
  }

  /** The Witt class of the part of a degree modulo I³, formally. */
  witt(degree: number): WittSymbols | undefined {
    const { classes, terms, budget } = this;
    this.symbols ??= classes.image(
      terms,
      residueRing(
        wittSymbolRing<B>(({ exponents }) => oddMask(exponents)),
        classes.minusOne,
      ),
      budget,
    );
    return this.symbols.get(degree);
  }

  /** The signatures of the part of a degree at the real places. */
  signatures(degree: number): readonly bigint[] {
    const { classes, terms, budget, arithmetic } = this;
    this.signs ??= arithmetic.realPlaces.map((isNegative) =>
      classes.image(
        terms,
        residueRing(
          signatureRing<B>(({ exponents }) => isNegative(oddMask(exponents))),
          classes.minusOne,
        ),
        budget,
      ),
    );
    return this.signs.map((values) => BigInt(values.get(degree) ?? 0));
  }

  /**
   * The part of a degree in canonical words of the generators, taken as independent: `undefined` for 0, which then holds over every
   * field; `too long` where that would take too many words.
   */
  words(degree: number): Words | undefined | 'too long' {
    this.written ??= this.writeOut();
    return this.written === 'too long' ? this.written : this.written.get(degree);
  }

  /** The part of a degree as an expression that is not simplified, and may be that of 0. Refused when it is too long, too. */
  expression(degree: number): Expression {
    const { classes, terms, budget } = this;
    const { field, generators } = classes;
    const write = (unit: B): Element => {
      const found: Element[] = [];
      forEachGenerator(unit, (i, e) => {
        const base = field.write(generators[i]!);
        found.push(e === 1 ? base : powerElement(base, Number(e)));
      });
      return found.length === 0 ? integerElement(1n) : found.length === 1 ? found[0]! : productElement(found);
    };
    this.unsimplified ??= classes.image(terms, residueRing(expressionRing(write), classes.minusOne), budget);
    return this.unsimplified.get(degree)?.expression ?? zeroExpression;
  }

  private writeOut(): Graded<Words> | 'too long' {
    const { classes, terms, budget } = this;
    const ring = mappedRing(wordRing('zero', limitedBudget(budget, WORD_STEPS)), monomial);
    try {
      return classes.image(terms, residueRing<B, Words>(ring, classes.minusOne), limitedBudget(budget, WORD_STEPS));
    } catch (error) {
      if (error instanceof Exhausted || (error instanceof Refusal && error.code === 'size')) return 'too long';
      throw error;
    }
  }
}

function factored(unit: NumberUnit): { readonly negative: boolean; readonly exponents: ReadonlyMap<number, Int> } {
  const exponents = new Map<number, Int>();
  forEachGenerator(unit, (i, e) => void (i > 0 && exponents.set(i, e)));
  return { negative: (oddMask(unit.exponents) & 1n) === 1n, exponents };
}

/** A unit as a monomial in letters, one for each generator but −1: generator i is letter i − 1. */
function monomial(unit: NumberUnit): Monomial {
  const { negative, exponents } = factored(unit);
  return { negative, exponents: new Map([...exponents].map(([i, e]) => [i - 1, BigInt(e)])) };
}
