import { grammar, type Grammar, type MatchResult, type Semantics } from 'ohm-js';
import type { Element } from '../engine/expression/element';
import type { Expression } from '../engine/expression/expression';
import type { FieldName } from '../engine/expression/field-name';
import type { Condition, Statement } from '../engine/expression/statement';
import { diagnose, type Reading } from './diagnose';
import { addElementActions } from './element-actions';
import { addExpressionActions } from './expression-actions';
import { addFieldActions } from './field-actions';
import { checkSize } from './limits';
import { quadrelSource } from './quadrel-source';
import { addStatementActions } from './statement-actions';

interface Language {
  readonly rules: Grammar;
  readonly semantics: Semantics;
}

let language: Language | undefined;

/** The grammar of quadrel.ohm with its actions, built at the first use. */
function quadrel(): Language {
  if (language) return language;
  const rules = grammar(quadrelSource);
  const semantics = rules.createSemantics();
  addElementActions(semantics);
  addExpressionActions(semantics);
  addStatementActions(semantics);
  addFieldActions(semantics);
  language = { rules, semantics };
  return language;
}

const startRules: Record<Reading, string> = {
  expression: 'wholeExpression',
  statement: 'wholeStatement',
  element: 'wholeElement',
  condition: 'wholeCondition',
  field: 'wholeFieldName',
};

function match(text: string, reading: Reading): MatchResult {
  checkSize(text, reading === 'statement' ? 'statement' : 'expression');
  const result = quadrel().rules.match(text, startRules[reading]);
  if (result.failed()) throw diagnose(text, result.getRightmostFailurePosition(), reading);
  return result;
}

/**
 * Reads a word of Milnor–Witt K-theory, as text, TeX or Unicode.
 *
 * Every node carries the stretch of `text` it was read from. Throws a ReadingError for anything else, and for a text past
 * the limits of limits.ts. That entries are units of a field is not looked at here.
 */
export const readExpression = (text: string): Expression =>
  quadrel().semantics(match(text, 'expression')).expression() as Expression;

/** Reads an expression, an equality or a chain of equalities, with its hypotheses after a semicolon. */
export const readStatement = (text: string): Statement =>
  quadrel().semantics(match(text, 'statement')).statement() as Statement;

/** Reads a field element, as it stands inside a bracket. */
export const readElement = (text: string): Element => quadrel().semantics(match(text, 'element')).element() as Element;

/** Reads one hypothesis: a ≠ b, a = b, char ≠ p, char = p. Whether p is a prime is not looked at here. */
export const readCondition = (text: string): Condition =>
  quadrel().semantics(match(text, 'condition')).condition() as Condition;

/** Reads the name of a field. Its arithmetic (is the order a prime power, the modulus irreducible) is not looked at here. */
export const readFieldName = (text: string): FieldName =>
  quadrel().semantics(match(text, 'field')).fieldName() as FieldName;
