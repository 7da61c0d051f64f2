import { unlimited } from '@/engine/arith/budget';
import type { Residue, ResiduesOutcome } from '@/engine/decide/outcome';
import { residues } from '@/engine/decide/residues';
import type { Element } from '@/engine/expression/element';
import { epsilon, power, product, type Expression } from '@/engine/expression/expression';
import { expressionText } from '@/engine/expression/to-text';
import { readElement, readExpression } from '@/grammar/read';
import { field } from './kmw-engine';

/** The residue and the specialisation of a class of K^MW_*(ℚ) at a prime, read back from the texts the engine answers. */
export interface AtPrime {
  readonly d: Expression;
  readonly s: Expression;
  readonly answer: Residue;
}

export function residuesOf(
  expression: Expression | string,
  places?: readonly string[],
  uniformizer?: Element,
): ResiduesOutcome {
  const tree = typeof expression === 'string' ? readExpression(expression) : expression;
  const asked = places?.map((text) => ({ text, element: () => readElement(text) }));
  return residues(field('Q'), tree, { places: asked, uniformizer }, unlimited);
}

export function at(p: number, expression: Expression | string, uniformizer?: string): AtPrime {
  const { residues: list } = residuesOf(
    expression,
    [`${p}`],
    uniformizer === undefined ? undefined : readElement(uniformizer),
  );
  const [answer] = list;
  if (answer === undefined || list.length > 1) throw new RangeError(`${list.length} residues for one place`);
  return {
    d: readExpression(expressionText(answer.value)),
    s: readExpression(expressionText(answer.specialisation)),
    answer,
  };
}

/** εⁿ·e for any integer n: ε is an involution. */
export const twisted = (n: number, e: Expression): Expression => product([power(epsilon(), Math.abs(n)), e]);
