import type { Element } from '@/engine/expression/element';
import type { Expression } from '@/engine/expression/expression';
import type { FieldName } from '@/engine/expression/field-name';
import type { Condition, Statement } from '@/engine/expression/statement';
import { readCondition, readElement, readExpression, readFieldName, readStatement } from '@/grammar/read';
import { ReadingError } from '@/grammar/reading-error';
import { Declined, syntaxProblem } from './declined';
import type { Source } from './source';

/**
 * Reads the texts of one request and keeps them, so that a later refusal can be placed. Every method throws `Declined` for a
 * text that cannot be read, naming the key of the request it stood in.
 */
export class Reader {
  readonly sources: Source[] = [];

  expression(part: string, text: string): Expression {
    return this.read(part, text, readExpression);
  }

  statement(part: string, text: string): Statement {
    return this.read(part, text, readStatement);
  }

  element(part: string, text: string): Element {
    return this.read(part, text, readElement);
  }

  conditions(texts: readonly string[] = []): readonly Condition[] {
    return texts.map((text, index) => this.read(`hypotheses[${index}]`, text, readCondition));
  }

  fieldName(text: string): FieldName {
    return this.read('field', text, readFieldName);
  }

  private read<Tree>(part: string, text: string, reader: (text: string) => Tree): Tree {
    try {
      const tree = reader(text);
      this.sources.push({ part, text, tree });
      return tree;
    } catch (error) {
      if (error instanceof ReadingError) throw new Declined(syntaxProblem(error, part));
      throw error;
    }
  }
}

/** Whether a text reads as an equality or a chain of them, where an expression was asked for. */
export function isEquation(text: string): boolean {
  if (!text.includes('=')) return false;
  try {
    return readStatement(text).sides.length > 1;
  } catch (error) {
    if (error instanceof ReadingError) return false;
    throw error;
  }
}
