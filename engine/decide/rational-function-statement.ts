import type { Budget } from '../arith/budget';
import type { Expression } from '../expression/expression';
import { factorOverRationals } from '../field/factor-rational';
import { functionField } from '../field/function-field';
import { compareIntegerPolynomials, primitiveOfRational } from '../field/integer-polynomial';
import { rationalPolynomialTools } from '../field/rational-polynomial-tools';
import { rationals, type Rational } from '../field/rational';
import { functionStatement, type Constants, type FunctionStatement } from './function-statement';

/** ℚ as constants. */
export const rationalConstants = (letter: string, budget: Budget): Constants<Rational> => ({
  functions: functionField(rationals, letter, rationalPolynomialTools(budget)),
  nameOf: ({ num, den }) => `${num}/${den}`,
  factor: (f) => factorOverRationals(f, budget).factors,
  compare: (f, g) => compareIntegerPolynomials(primitiveOfRational(f).primitive, primitiveOfRational(g).primitive),
});

/** Reads the entries of expressions as units of ℚ(letter). */
export const rationalFunctionStatement = (
  letter: string,
  expressions: readonly Expression[],
  budget: Budget,
): FunctionStatement<Rational> => functionStatement(rationalConstants(letter, budget), expressions, budget);
