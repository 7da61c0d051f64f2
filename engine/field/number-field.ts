import { letterElement } from '../expression/element';
import { bitLength } from '../arith/bits';
import { elementTex } from '../expression/to-tex';
import { elementText } from '../expression/to-text';
import type { Field } from './field';
import { integralModel, type IntegralModel } from './integral-model';
import { multiplyIntegers } from './integer-polynomial';
import { inverseModuloMonic } from './integer-inverse';
import { normOf, powerSums, remainderByMonic } from './integer-residues';
import {
  addPolynomials,
  constant,
  negatePolynomial,
  remainderPolynomial,
  subtractPolynomials,
  type Polynomial,
} from './polynomial';
import { rational, rationals, type Rational } from './rational';
import { writePolynomial } from './write-polynomial';

/** An element of a number field: its polynomial in the letter, of degree below that of the field. */
export type NumberFieldElement = Polynomial<Rational>;

/** A number field given as ℚ[letter]/(modulus). */
export interface NumberField extends Field<NumberFieldElement> {
  readonly base: Field<Rational>;
  /** The letter that stands for the class of the variable. */
  readonly generator: string;
  /** The monic irreducible modulus, coefficients from the constant term up. */
  readonly modulus: Polynomial<Rational>;
  readonly model: IntegralModel;
  /** The norm and the trace to ℚ. */
  norm(a: NumberFieldElement): Rational;
  trace(a: NumberFieldElement): Rational;
}

/**
 * ℚ[letter]/(modulus), with the modulus monic and irreducible of degree ≥ 1 over ℚ: that is the caller's knowledge and not tested
 * again here. Products and inverses are taken over ℤ, in the powers of an integral multiple of the letter.
 */
export function numberField(letter: string, modulus: Polynomial<Rational>): NumberField {
  const n = modulus.length - 1;
  if (n < 1 || !rationals.equal(modulus[n]!, rationals.one)) {
    throw new RangeError('a modulus is monic of degree at least 1');
  }
  type P = NumberFieldElement;
  const model = integralModel(modulus);
  const sums = powerSums(model.modulus);
  const written = writePolynomial(rationals, modulus, letter);
  const one: P = [rationals.one];
  const variable = remainderPolynomial(rationals, [rationals.zero, rationals.one], modulus);

  const multiply = (a: P, b: P): P => {
    if (a.length === 0 || b.length === 0) return [];
    const [f, g] = [model.integral(a), model.integral(b)];
    const product = remainderByMonic(multiplyIntegers(f.numerator, g.numerator), model.modulus);
    return model.element(product, f.denominator * g.denominator);
  };

  return Object.freeze<NumberField>({
    name: `Q[${letter}]/(${elementText(written)})`,
    tex: `\\mathbb{Q}[${elementTex(letterElement(letter))}]/(${elementTex(written)})`,
    base: rationals,
    generator: letter,
    modulus,
    model,
    characteristic: 0n,
    zero: [],
    one,
    add: (a, b) => addPolynomials(rationals, a, b),
    subtract: (a, b) => subtractPolynomials(rationals, a, b),
    multiply,
    negate: (a) => negatePolynomial(rationals, a),
    inverse(a) {
      if (a.length === 0) throw new RangeError('0 has no inverse');
      const { numerator, denominator } = model.integral(a);
      const found = inverseModuloMonic(numerator, model.modulus);
      return model.element(
        found.numerator.map((c) => c * denominator),
        found.denominator,
      );
    },
    isZero: (a) => a.length === 0,
    equal: (a, b) => a.length === b.length && a.every((c, i) => rationals.equal(c, b[i]!)),
    fromInteger: (m) => constant(rationals, rational(m)),
    letter: (name) => (name === letter ? variable : undefined),
    write: (a) => writePolynomial(rationals, a, letter),
    size: (a) =>
      a.reduce((largest, { num, den }) => {
        const [top, bottom] = [bitLength(num), bitLength(den)];
        const here = top > bottom ? top : bottom;
        return here > largest ? here : largest;
      }, 0),
    norm(a) {
      if (a.length === 0) return rationals.zero;
      const { numerator, denominator } = model.integral(a);
      return rational(
        normOf(numerator, model.modulus, () => undefined),
        denominator ** BigInt(n),
      );
    },
    trace(a) {
      const { numerator, denominator } = model.integral(a);
      return rational(
        numerator.reduce((sum, c, i) => sum + c * sums[i]!, 0n),
        denominator,
      );
    },
  });
}
