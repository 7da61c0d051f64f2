import { unlimited } from '../arith/budget';
import { factoredFunctions } from '../field/factored-function';
import { checkConcreteConditions } from './concrete-conditions';
import type { DecidableField } from './decidable-field';
import { rationalFunctionDecision } from './rational-function-findings';
import { rationalFunctionNormalForm } from './rational-function-normal-form';
import { rationalFunctionResidues } from './rational-function-residues';
import { rationalConstants, rationalFunctionStatement } from './rational-function-statement';

/**
 * ℚ(letter): complete but for residues that land in K_2 of a number field, in degree 3, at places of degree ≥ 2; these are settled as
 * far as `zeroTest` goes.
 */
export function rationalFunctionField(letter: string): DecidableField {
  const { name, tex } = rationalConstants(letter, unlimited).functions;
  return {
    name,
    tex,
    decide(left, right, conditions, budget) {
      checkConcreteConditions(factoredFunctions(rationalConstants(letter, budget).functions), conditions, budget);
      const statement = rationalFunctionStatement(letter, [left, right], budget);
      return { ...rationalFunctionDecision(statement, budget), theorem: THEOREM };
    },
    normalForm(expression, conditions, budget) {
      checkConcreteConditions(factoredFunctions(rationalConstants(letter, budget).functions), conditions, budget);
      return rationalFunctionNormalForm(rationalFunctionStatement(letter, [expression], budget), budget);
    },
    derivation: () => undefined,
    sideConditions: () => [],
    residues: (expression, places, uniformizer, budget) =>
      rationalFunctionResidues(rationalFunctionStatement(letter, [expression], budget), places, uniformizer, budget),
  };
}

const THEOREM =
  'Over Q(t) the specialisation at infinity and the residues at all monic irreducible polynomials see every class ' +
  '(J. Milnor, Algebraic K-theory and quadratic forms, Invent. Math. 9, 1970, Theorem 2.3; F. Morel, A¹-Algebraic Topology over a Field, ' +
  'LNM 2052, Theorem 3.24, number from memory). Values over Q are compared by rank, signature and residues at primes (Tate, in J. Milnor, ' +
  'Introduction to Algebraic K-Theory, §11), values over number fields by units, signatures and Hasse–Minkowski (T. Y. Lam, Introduction ' +
  'to Quadratic Forms over Fields, VI.3, number from memory).';
