import { unlimited } from '../arith/budget';
import { functionField } from '../field/function-field';
import type { FiniteField } from '../field/field';
import { finitePolynomialTools } from '../field/polynomial-tools';
import { checkConcreteConditions } from './concrete-conditions';
import type { DecidableField } from './decidable-field';
import { finiteFunctionFindings } from './finite-function-findings';
import { finiteFunctionNormalForm } from './finite-function-normal-form';
import { finiteFunctionResidues } from './finite-function-residues';
import { finiteFunctionStatement } from './finite-function-statement';

/** k(letter) over a finite field k, complete in every degree. */
export function finiteFunctionField<E>(base: FiniteField<E>, letter: string): DecidableField {
  const { name, tex } = functionField(base, letter, finitePolynomialTools(base, unlimited));
  return {
    name,
    tex,
    decide(left, right, conditions, budget) {
      const statement = finiteFunctionStatement(base, letter, [left, right], budget);
      checkConcreteConditions(statement.written, conditions, budget);
      return { findings: finiteFunctionFindings(statement, budget), theorem: THEOREM };
    },
    normalForm(expression, conditions, budget) {
      const statement = finiteFunctionStatement(base, letter, [expression], budget);
      checkConcreteConditions(statement.written, conditions, budget);
      return finiteFunctionNormalForm(statement, budget);
    },
    derivation: () => undefined,
    sideConditions: () => [],
    residues: (expression, places, uniformizer, budget) =>
      finiteFunctionResidues(finiteFunctionStatement(base, letter, [expression], budget), places, uniformizer, budget),
  };
}

const THEOREM =
  'Over k(t) with k finite the specialisation at infinity and the residues at all monic irreducible polynomials see every class ' +
  '(J. Milnor, Algebraic K-theory and quadratic forms, Invent. Math. 9, 1970, Theorem 2.3; F. Morel, A¹-Algebraic Topology over a Field, ' +
  'LNM 2052, Theorem 3.24, number from memory), and over the finite residue fields rank, discriminant and units do.';
