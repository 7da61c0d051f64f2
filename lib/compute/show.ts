import type { Element } from '@/engine/expression/element';
import type { Expression } from '@/engine/expression/expression';
import type { Condition, Statement } from '@/engine/expression/statement';
import { conditionTex, elementTex, expressionTex, statementTex } from '@/engine/expression/to-tex';
import { conditionText, elementText, expressionText, statementText } from '@/engine/expression/to-text';
import type { FieldAnswer, Typeset } from '@/lib/contracts/typeset';
import type { ResolvedField } from './fields';

export const showExpression = (expression: Expression): Typeset => ({
  text: expressionText(expression),
  tex: expressionTex(expression),
});

export const showElement = (element: Element): Typeset => ({ text: elementText(element), tex: elementTex(element) });

export const showCondition = (condition: Condition): Typeset => ({
  text: conditionText(condition),
  tex: conditionTex(condition),
});

export const showStatement = (statement: Statement): Typeset => ({
  text: statementText(statement),
  tex: statementTex(statement),
});

/** The Milnor–Witt group of a field in one degree. */
export const showGroup = (fieldTex: string, degree: number): { tex: string } => ({
  tex: `K^{\\mathrm{MW}}_{${degree}}(${fieldTex})`,
});

/** A field as answers name it. */
export const showField = ({ field, modulus }: ResolvedField): FieldAnswer => ({
  text: field.name,
  tex: field.tex,
  ...(modulus === undefined ? {} : { modulus: { text: elementText(modulus), tex: elementTex(modulus) } }),
});
