import type { Budget } from '../arith/budget';
import type { Word } from '../derive/combination';
import { derivation } from '../derive/derivation';
import { finiteRules, unitAtoms } from '../derive/finite-rules';
import type { Expression } from '../expression/expression';
import type { FiniteField } from '../field/field';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import { classedUnit, fieldUnits } from '../ring/field-units';
import { lower } from '../ring/lower';
import { residueClassRing, type ClassedUnit } from '../ring/residue-class-ring';
import type { Term } from '../ring/term';
import { writeResidueClass } from '../ring/write-residue-class';
import type { DecidableField } from './decidable-field';
import { checkConcreteConditions } from './concrete-conditions';
import { unitReader } from './read-unit';
import { ResidueClassFinding } from './residue-class-finding';

const THEOREM =
  'Over a finite field K^MW_n is 0 for n ≥ 2, the units for n = 1, and forms are classified by rank and discriminant ' +
  '(K_2 = 0: J. Milnor, Introduction to Algebraic K-Theory, §9; forms: T. Y. Lam, Introduction to Quadratic Forms over Fields, II.3; ' +
  'J. Milnor, D. Husemoller, Symmetric Bilinear Forms, for characteristic 2).';

/**
 * 𝔽_q decides by its own closed form: K^MW_n(𝔽_q) is 0 for n ≥ 2, 𝔽_q^× for n = 1, GW(𝔽_q) for n = 0 and W(𝔽_q) for n < 0.
 */
export function decidableFiniteField<E>(field: FiniteField<E>): DecidableField {
  const units = fieldUnits(field);
  const ring = residueClassRing(units);
  const read = (expression: Expression, budget: Budget): readonly Term<ClassedUnit<E>>[] => {
    const unit = unitReader(field, budget);
    return lower(expression, (entry) => classedUnit(field, unit(entry)));
  };

  return {
    name: field.name,
    tex: field.tex,
    decide(left, right, conditions, budget) {
      checkConcreteConditions(field, conditions, budget);
      const sides = [read(left, budget), read(right, budget)] as const;
      const [l, r] = [evaluate(sides[0], ring, budget), evaluate(sides[1], ring, budget)];
      const origin = { map: 'class', field, units, where: `in ${field.name}` } as const;
      const findings = degreesOf([...sides[0], ...sides[1]]).map(
        (degree) => new ResidueClassFinding(origin, degree, degree, l.get(degree), r.get(degree)),
      );
      return { findings, theorem: THEOREM };
    },
    normalForm(expression, conditions, budget) {
      checkConcreteConditions(field, conditions, budget);
      const value = evaluate(read(expression, budget), ring, budget);
      return [...value]
        .sort(([a], [b]) => b - a)
        .map(([degree, part]) => ({ degree, normalForm: writeResidueClass(field, degree, part), canonical: true }));
    },
    derivation: (expression, form, _conditions, budget) =>
      derivation(
        expression,
        form,
        () => ({
          atoms: unitAtoms(field),
          rules: finiteRules(field),
          read: unitReader(field, budget),
          compareWords: (a, b) => degreeOf(b) - degreeOf(a),
          conclusion: 'in degree 1 the product of the units, in degrees ≤ 0 rank and discriminant',
        }),
        budget,
      ),
    sideConditions: () => [],
  };
}

const degreeOf = (word: Word<unknown>): number =>
  word.letters.reduce((sum, letter) => sum + (letter.kind === 'eta' ? -1 : 1), 0);
