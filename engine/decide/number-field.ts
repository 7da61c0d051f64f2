import { Refusal } from '../expression/refusal';
import type { NumberField } from '../field/number-field';
import { total } from '../ring/write-word';
import { checkConcreteConditions } from './concrete-conditions';
import type { DecidableField } from './decidable-field';
import { NumberArithmetic } from './number-arithmetic';
import { numberFindings } from './number-findings';
import { numberStatement } from './number-statement';
import { NumberValue } from './number-value';
import { numberWords, writeWords } from './number-writing';

/** A number field: complete but for degree 2, where K_2 is seen modulo squares and by tame symbols, and by proofs that it is 0. */
export function decidableNumberField(field: NumberField): DecidableField {
  const { name, tex } = field;
  return {
    name,
    tex,
    decide(left, right, conditions, budget) {
      checkConcreteConditions(field, conditions, budget);
      const classes = numberStatement(field, [left, right], budget);
      const arithmetic = new NumberArithmetic(field, classes.generators, budget);
      return { ...numberFindings({ map: 'class', shift: 0 }, classes, arithmetic, budget), theorem: THEOREM };
    },
    normalForm(expression, conditions, budget) {
      checkConcreteConditions(field, conditions, budget);
      const classes = numberStatement(field, [expression], budget);
      const [terms = []] = classes.sides;
      const arithmetic = new NumberArithmetic(field, classes.generators, budget);
      const value = new NumberValue(classes, arithmetic, terms, budget);
      return classes.degrees(terms).flatMap((degree) => {
        const words = numberWords(value, degree, classes, arithmetic);
        if (words.length === 0) return [];
        return [{ degree, normalForm: total([writeWords(words, (a) => field.write(a))]), canonical: false }];
      });
    },
    derivation: () => undefined,
    sideConditions: () => [],
    residues() {
      throw new Refusal(
        'not-yet',
        `Residues at the primes of a number field such as ${name} are not offered yet. Choose Q or a field of rational functions.`,
      );
    },
  };
}

const THEOREM =
  'Over a number field the product of entries sees K_1 and rank, discriminant, signatures and Hilbert symbols see the Witt ring ' +
  '(Hasse–Minkowski: T. Y. Lam, Introduction to Quadratic Forms over Fields, VI.3, number from memory); from degree 3 on signatures see everything ' +
  '(H. Bass, J. Tate, The Milnor ring of a global field, Theorem II.2.1, number from memory). ' +
  'In degree 2 tame symbols are compared and a proof by Steinberg relations is looked for. Together by the pull-back theorem (F. Morel, ' +
  'Comment. Math. Helv. 79, 2004).';
