import type { Element } from './element';
import { type ElementStyle, printElement } from './element-print';
import type { Expression } from './expression';
import { type ExpressionStyle, printExpression } from './expression-print';
import type { FieldName } from './field-name';
import type { Condition, Statement } from './statement';

const elementStyle: ElementStyle = {
  letter: (name) => name,
  power: (base, exponent) => `${base}^${exponent}`,
  quotient: null,
  times: '*',
  wrap: (inner) => `(${inner})`,
};

/** The field element as plain text: `t^2-1`, `1/(2t)`, `2*3`. Reading it back gives the same tree. */
export const elementText = (element: Element): string => printElement(element, elementStyle);

const expressionStyle: ExpressionStyle = {
  entry: elementText,
  symbol: ['[', ']'],
  angle: ['<', '>'],
  pfister: ['<<', '>>'],
  eta: 'eta',
  hyperbolic: 'h',
  epsilon: 'eps',
  epsilonInteger: (count) => (count < 0n ? `(${count})_eps` : `${count}_eps`),
  power: (base, exponent) => `${base}^${exponent}`,
  times: '*',
  wrap: (inner) => `(${inner})`,
  between: (left, right) => {
    if (/^[0-9]|^\(-?[0-9]+\)_/.test(right)) return '*';
    return /[a-z]$|\^[0-9]+$/.test(left) && /^[a-z]/.test(right) ? ' ' : '';
  },
};

/** The word as plain text: `[2][-1] + 3eta^2[5]`. Reading it back gives the same tree. */
export const expressionText = (expression: Expression): string => printExpression(expression, expressionStyle);

/** The hypothesis as plain text: `a != 1`, `char != 2`. */
export function conditionText(condition: Condition): string {
  if (condition.kind === 'characteristic') return `char ${condition.is ? '=' : '!='} ${condition.prime}`;
  const left = elementText(condition.left);
  return `${/^char(?![a-z])/i.test(left) ? `(${left})` : left} ${condition.kind === 'equal' ? '=' : '!='} ${elementText(condition.right)}`;
}

/** The statement as plain text: `[a][1-a] = 0 ; a != 1`. */
export function statementText(statement: Statement): string {
  const sides = statement.sides.map(expressionText).join(' = ');
  return statement.conditions.length === 0 ? sides : `${sides} ; ${statement.conditions.map(conditionText).join(', ')}`;
}

/** The name of the field as plain text: `Q`, `F_9[y]/(y^2+z+1)`, `F_7(t)`. */
export function fieldNameText(field: FieldName): string {
  switch (field.kind) {
    case 'rationals':
      return 'Q';
    case 'reals':
      return 'R';
    case 'complexes':
      return 'C';
    case 'padics':
      return `Q_${field.prime}`;
    case 'finite':
      return `F_${field.order}`;
    case 'extension':
      return `${fieldNameText(field.base)}[${field.letter}]/(${elementText(field.modulus)})`;
    case 'functions':
      return `${fieldNameText(field.base)}(${field.letter})`;
    case 'any':
      return 'any';
  }
}
