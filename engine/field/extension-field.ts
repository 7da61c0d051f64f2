import { letterElement } from '../expression/element';
import { elementTex } from '../expression/to-tex';
import { elementText } from '../expression/to-text';
import type { Field, FiniteField } from './field';
import {
  addPolynomials,
  constant,
  degree,
  invertPolynomial,
  multiplyPolynomials,
  negatePolynomial,
  remainderPolynomial,
  resultant,
  subtractPolynomials,
  type Polynomial,
} from './polynomial';
import { writePolynomial } from './write-polynomial';

/** A finite field given as base[letter]/(modulus). */
export interface ExtensionField<E> extends FiniteField<Polynomial<E>> {
  readonly base: FiniteField<E>;
  /** The letter that stands for the class of the variable. */
  readonly generator: string;
  /** The monic irreducible modulus, coefficients from the constant term up. */
  readonly modulus: Polynomial<E>;
}

/** The letters of a field, its own generator before those of its base; none for ℚ and the prime fields. */
export function lettersOf(field: Field<unknown>): readonly string[] {
  return isExtension(field) ? [field.generator, ...lettersOf(field.base)] : [];
}

const isExtension = (field: Field<unknown>): field is ExtensionField<unknown> =>
  'generator' in field && 'base' in field;

/**
 * The finite field base[letter]/(modulus) of degree d = deg modulus ≥ 1 over any finite field, towers included. The modulus is
 * monic and irreducible: that is the caller's knowledge and not tested again here. An element is its polynomial in the
 * letter of degree < d. `named` gives the field a name of its own, as for `F_9`.
 */
export function extensionField<E>(
  base: FiniteField<E>,
  letter: string,
  modulus: Polynomial<E>,
  named?: { readonly name: string; readonly tex: string },
): ExtensionField<E> {
  const d = degree(modulus);
  if (d < 1 || !base.equal(modulus[d]!, base.one)) throw new RangeError('a modulus is monic of degree at least 1');
  type P = Polynomial<E>;
  const order = base.order ** BigInt(d);
  const one: P = [base.one];
  const variable = remainderPolynomial(base, [base.zero, base.one], modulus);
  const written = writePolynomial(base, modulus, letter);

  const multiply = (a: P, b: P): P => remainderPolynomial(base, multiplyPolynomials(base, a, b), modulus);
  const inverse = (a: P): P => {
    const found = a.length === 0 ? undefined : invertPolynomial(base, a, modulus);
    if (found === undefined) throw new RangeError('0 has no inverse');
    return found;
  };
  const element = (index: bigint): P => {
    const coefficients: E[] = [];
    for (let rest = index; rest > 0n; rest /= base.order) coefficients.push(base.element(rest % base.order));
    return coefficients;
  };
  /**
   * The norm to the base is surjective on units, so a is a square iff its norm is (R. Lidl, H. Niederreiter, Finite Fields,
   * Theorem 2.28 for the norm; the rest is that both groups of units are cyclic). The norm is a resultant.
   */
  const isSquare = (a: P): boolean => base.characteristic === 2n || base.isSquare(resultant(base, modulus, a));
  let least: P | undefined;

  return Object.freeze<ExtensionField<E>>({
    name: named?.name ?? `${base.name}[${letter}]/(${elementText(written)})`,
    tex: named?.tex ?? `${base.tex}[${elementTex(letterElement(letter))}]/(${elementTex(written)})`,
    base,
    generator: letter,
    modulus,
    characteristic: base.characteristic,
    order,
    zero: [],
    one,
    add: (a, b) => addPolynomials(base, a, b),
    subtract: (a, b) => subtractPolynomials(base, a, b),
    multiply,
    negate: (a) => negatePolynomial(base, a),
    inverse,
    isZero: (a) => a.length === 0,
    equal: (a, b) => a.length === b.length && a.every((c, i) => base.equal(c, b[i]!)),
    fromInteger: (n) => constant(base, base.fromInteger(n)),
    letter(name) {
      if (name === letter) return variable;
      const below = base.letter(name);
      return below === undefined ? undefined : constant(base, below);
    },
    write: (a) => writePolynomial(base, a, letter),
    element,
    index: (a) => a.reduceRight((value, c) => value * base.order + base.index(c), 0n),
    power(a, n) {
      let result = one;
      const factor = n < 0n ? inverse(a) : a;
      for (const bit of (n < 0n ? -n : n).toString(2)) {
        result = multiply(result, result);
        if (bit === '1') result = multiply(result, factor);
      }
      return result;
    },
    isSquare,
    get nonSquare() {
      if (base.nonSquare === undefined) return undefined;
      if (least !== undefined) return least;
      // In an extension of odd degree the base keeps its non-squares; in one of even degree all of the base is square.
      if (d % 2 === 1) return (least = [base.nonSquare]);
      for (let index = base.order; least === undefined; index++) {
        const candidate = element(index);
        if (!isSquare(candidate)) least = candidate;
      }
      return least;
    },
  });
}
