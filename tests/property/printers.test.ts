import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { conditionTex, elementTex, expressionTex, fieldNameTex, statementTex } from '@/engine/expression/to-tex';
import { conditionText, elementText, expressionText, fieldNameText, statementText } from '@/engine/expression/to-text';
import { readCondition, readElement, readExpression, readFieldName, readStatement } from '@/grammar/read';
import {
  withoutPlaces,
  writtenCondition,
  writtenElement,
  writtenExpression,
  writtenFieldName,
  writtenStatement,
} from './printers-trees';

/** Reading what was printed gives the tree that was printed. */
function comesBack<T>(
  trees: fc.Arbitrary<T>,
  print: (tree: T) => string,
  read: (text: string) => T,
  numRuns = 400,
): void {
  fc.assert(
    fc.property(trees, (tree) => {
      expect(withoutPlaces(read(print(tree)))).toEqual(withoutPlaces(tree));
    }),
    { numRuns },
  );
}

describe('reading what was printed gives the same tree', () => {
  it('field elements as text', () => comesBack(writtenElement, elementText, readElement));
  it('field elements in TeX', () => comesBack(writtenElement, elementTex, readElement));
  it('words as text', () => comesBack(writtenExpression, expressionText, readExpression));
  it('words in TeX', () => comesBack(writtenExpression, expressionTex, readExpression));
  it('hypotheses as text', () => comesBack(writtenCondition, conditionText, readCondition));
  it('hypotheses in TeX', () => comesBack(writtenCondition, conditionTex, readCondition));
  it('statements as text', () => comesBack(writtenStatement, statementText, readStatement, 150));
  it('statements in TeX', () => comesBack(writtenStatement, statementTex, readStatement, 150));
  it('names of fields as text', () => comesBack(writtenFieldName, fieldNameText, readFieldName));
  it('names of fields in TeX', () => comesBack(writtenFieldName, fieldNameTex, readFieldName));
});

describe('every node stands where its text stands', () => {
  it('the text of a node, read alone, gives the node', () => {
    fc.assert(
      fc.property(writtenExpression, fc.boolean(), (tree, inTex) => {
        const text = inTex ? expressionTex(tree) : expressionText(tree);
        const whole = readExpression(text);
        const parts = whole.kind === 'sum' ? whole.terms : whole.kind === 'product' ? whole.factors : [];
        for (const part of parts) {
          expect(part.at).toBeDefined();
          const alone = readExpression(text.slice(part.at?.start, part.at?.end));
          expect(withoutPlaces(alone)).toEqual(withoutPlaces(part.kind === 'negate' ? alone : part));
        }
      }),
      { numRuns: 200 },
    );
  });
});
