import { rationals } from '../field/rational';
import { checkConcreteConditions } from './concrete-conditions';
import type { DecidableField } from './decidable-field';
import { wordClasses } from './rational-classes';
import { rationalDerivation } from './rational-derivation';
import { rationalFindings } from './rational-findings';
import { rationalNormalForm } from './rational-normal-form';
import { rationalResidues } from './rational-residues';
import { rationalStatement } from './rational-statement';

/** ℚ, complete in every degree. */
export const rationalField: DecidableField = {
  name: 'Q',
  tex: rationals.tex,
  decide(left, right, conditions, budget) {
    checkConcreteConditions(rationals, conditions, budget);
    return {
      findings: rationalFindings(wordClasses(rationalStatement([left, right], budget)), budget),
      theorem: THEOREM,
    };
  },
  normalForm(expression, conditions, budget) {
    checkConcreteConditions(rationals, conditions, budget);
    return rationalNormalForm(wordClasses(rationalStatement([expression], budget)), 0, budget);
  },
  derivation: (expression, form, _conditions, budget) =>
    rationalDerivation(
      expression,
      form,
      'signature, rank and the residues at all primes, from the largest down',
      budget,
    ),
  sideConditions: () => [],
  residues: rationalResidues,
};

const THEOREM =
  'Over Q rank, signature and the residues at all primes see every class (K_2: Tate, in J. Milnor, Introduction to Algebraic K-Theory, §11; ' +
  'W: J. Milnor, D. Husemoller, Symmetric Bilinear Forms, IV.2; together by the pull-back theorem, F. Morel, Comment. Math. Helv. 79, 2004).';
