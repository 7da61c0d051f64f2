import { type Grammar, makeRecipe } from 'ohm-js';
import type { Element } from '../engine/expression/element';
import type { Expression } from '../engine/expression/expression';
import type { FieldName } from '../engine/expression/field-name';
import type { Condition, Statement } from '../engine/expression/statement';
import { diagnose, type Reading } from './diagnose';
import { elementOf } from './element-tree';
import { expressionOf } from './expression-tree';
import { fieldNameOf } from './field-tree';
import { checkSize, tooDeepHere } from './limits';
import { quadrelRecipe } from './quadrel-recipe';
import { conditionOf, statementOf } from './statement-tree';
import { SyntaxNode } from './syntax-node';
import { undressed } from './tree-parts';

// The parser exports this function and leaves it out of its types.
declare module 'ohm-js' {
  export function makeRecipe(recipe: string): Grammar;
}

let rules: Grammar | undefined;

/** The grammar of quadrel.ohm, loaded at the first use. */
const quadrel = (): Grammar => (rules ??= makeRecipe(quadrelRecipe));

const startRules: Record<Reading, string> = {
  expression: 'wholeExpression',
  statement: 'wholeStatement',
  element: 'wholeElement',
  condition: 'wholeCondition',
  field: 'wholeFieldName',
};

/** Builds a tree from the syntax tree of a text without the marks around the whole, or throws a ReadingError. */
function parse<T>(text: string, reading: Reading, build: (node: SyntaxNode) => T): T {
  checkSize(text, reading === 'statement' ? 'statement' : 'expression');
  try {
    const result = quadrel().match(text, startRules[reading]);
    if (result.failed()) throw diagnose(text, result.getRightmostFailurePosition(), reading);
    return build(undressed(SyntaxNode.root(text, result)));
  } catch (error) {
    // The deepest nesting allowed fits the usual call stack; a host with a smaller one gets a refusal, not a crash.
    if (error instanceof RangeError) throw tooDeepHere(text);
    throw error;
  }
}

/**
 * Reads a word of Milnor–Witt K-theory, as text, TeX or Unicode.
 *
 * Every node carries the stretch of `text` it was read from. Throws a ReadingError for anything else, and for a text past
 * the limits of limits.ts. That entries are units of a field is not looked at here.
 */
export const readExpression = (text: string): Expression => parse(text, 'expression', expressionOf);

/** Reads an expression, an equality or a chain of equalities, with its hypotheses after a semicolon. */
export const readStatement = (text: string): Statement => parse(text, 'statement', statementOf);

/** Reads a field element, as it stands inside a bracket. */
export const readElement = (text: string): Element => parse(text, 'element', elementOf);

/** Reads one hypothesis: a ≠ b, a = b, char ≠ p, char = p. Whether p is a prime is not looked at here. */
export const readCondition = (text: string): Condition => parse(text, 'condition', conditionOf);

/** Reads the name of a field. Its arithmetic (is the order a prime power, the modulus irreducible) is not looked at here. */
export const readFieldName = (text: string): FieldName => parse(text, 'field', fieldNameOf);
