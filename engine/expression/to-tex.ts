import type { Element } from './element';
import { type ElementStyle, printElement } from './element-print';
import type { Expression } from './expression';
import { type ExpressionStyle, printExpression } from './expression-print';
import type { FieldName } from './field-name';
import type { Condition, Statement } from './statement';

/** Parentheses grow with what they hold where that is a fraction. */
const parentheses = (inner: string): string => (inner.includes('\\frac') ? `\\left(${inner}\\right)` : `(${inner})`);

/** `x12''` as `x_{12}''`. */
const texLetter = (name: string): string => {
  const index = /^([A-Za-z])(\d+)('*)$/.exec(name);
  return index ? `${index[1]}_{${index[2]}}${index[3]}` : name;
};

const elementStyle: ElementStyle = {
  letter: texLetter,
  power: (base, exponent) => `${base}^{${exponent}}`,
  quotient: (numerator, denominator) => `\\frac{${numerator}}{${denominator}}`,
  times: '\\cdot ',
  wrap: parentheses,
};

/** The field element in TeX: `t^{2}-1`, `\frac{1}{2t}`, `2\cdot 3`. Reading it back gives the same tree. */
export const elementTex = (element: Element): string => printElement(element, elementStyle);

const expressionStyle: ExpressionStyle = {
  entry: elementTex,
  symbol: ['[', ']'],
  angle: ['\\langle ', '\\rangle'],
  pfister: ['\\langle\\!\\langle ', '\\rangle\\!\\rangle'],
  eta: '\\eta',
  hyperbolic: 'h',
  epsilon: '\\varepsilon',
  epsilonInteger: (count) => `${count < 0n ? `(${count})` : count}_{\\varepsilon}`,
  power: (base, exponent) => `${base}^{${exponent}}`,
  times: '\\cdot ',
  wrap: parentheses,
  between: (left, right) => {
    if (/^[0-9]|^\(-?[0-9]+\)_/.test(right)) return '\\cdot ';
    return /\\[a-z]+$/.test(left) && /^[a-z]/.test(right) ? ' ' : '';
  },
};

/** The word in TeX: `[2][-1] + 3\eta^{2}[5]`. Reading it back gives the same tree. */
export const expressionTex = (expression: Expression): string => printExpression(expression, expressionStyle);

/** The hypothesis in TeX: `a \ne 1`, `\operatorname{char} \ne 2`. */
export function conditionTex(condition: Condition): string {
  if (condition.kind === 'characteristic') {
    return `\\operatorname{char} ${condition.is ? '=' : '\\ne'} ${condition.prime}`;
  }
  const left = elementTex(condition.left);
  return `${/^char(?![a-z])/i.test(left) ? `(${left})` : left} ${condition.kind === 'equal' ? '=' : '\\ne'} ${elementTex(condition.right)}`;
}

/** The statement in TeX: `[a][1-a] = 0 ;\ a \ne 1`. */
export function statementTex(statement: Statement): string {
  const sides = statement.sides.map(expressionTex).join(' = ');
  return statement.conditions.length === 0
    ? sides
    : `${sides} ;\\ ${statement.conditions.map(conditionTex).join(',\\ ')}`;
}

/** The name of the field in TeX: `\mathbb{Q}`, `\mathbb{F}_{9}[y]/(y^{2}+z+1)`; `any` is `\mathrm{any}`. */
export function fieldNameTex(field: FieldName): string {
  switch (field.kind) {
    case 'rationals':
      return '\\mathbb{Q}';
    case 'reals':
      return '\\mathbb{R}';
    case 'complexes':
      return '\\mathbb{C}';
    case 'padics':
      return `\\mathbb{Q}_{${field.prime}}`;
    case 'finite':
      return `\\mathbb{F}_{${field.order}}`;
    case 'extension':
      return `${fieldNameTex(field.base)}[${texLetter(field.letter)}]/(${elementTex(field.modulus)})`;
    case 'functions':
      return `${fieldNameTex(field.base)}(${texLetter(field.letter)})`;
    case 'any':
      return '\\mathrm{any}';
  }
}
