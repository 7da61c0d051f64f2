import type { MatchResult } from 'ohm-js';
import type { Span } from '../engine/expression/span';

/** What the parser leaves behind: nodes of rules, of iterations (one a column) and of characters. */
interface RawNode {
  readonly ruleName?: string;
  readonly matchLength: number;
  readonly children?: readonly RawNode[];
  /** Offsets of the children from the beginning of the nearest node of a rule. */
  readonly childOffsets?: readonly number[];
}

/**
 * A node of the syntax tree with its place in the text.
 *
 * The parser's own semantics wraps every node down to the single character before an action is called, which takes three
 * times as long as parsing; here a node is made only when it is looked at.
 */
export class SyntaxNode {
  private constructor(
    readonly text: string,
    private readonly raw: RawNode,
    readonly start: number,
    /** Where the offsets of the children are counted from. */
    private readonly base: number,
  ) {}

  /** The outermost node of a successful match. */
  static root(text: string, result: MatchResult): SyntaxNode {
    const { _cst: raw, _cstOffset: start } = result as unknown as {
      readonly _cst?: RawNode;
      readonly _cstOffset?: number;
    };
    if (!raw || start === undefined) throw new Error('There is no syntax tree after a failed match.');
    return new SyntaxNode(text, raw, start, start);
  }

  /** The rule that matched; the empty word for characters and iterations. */
  get rule(): string {
    return this.raw.ruleName ?? '';
  }

  get end(): number {
    return this.start + this.raw.matchLength;
  }

  get at(): Span {
    return { start: this.start, end: this.end };
  }

  get source(): string {
    return this.text.slice(this.start, this.end);
  }

  get count(): number {
    return this.raw.children?.length ?? 0;
  }

  /** The child of this number, which must be there. */
  child(index: number): SyntaxNode {
    const raw = this.raw.children?.[index];
    const offset = this.raw.childOffsets?.[index];
    if (!raw || offset === undefined) throw new Error(`The rule ${this.rule} has no child ${index}.`);
    const start = this.base + offset;
    return new SyntaxNode(this.text, raw, start, raw.ruleName === undefined ? this.base : start);
  }

  /** What the iteration or option at this number matched, in order. */
  each(index: number): readonly SyntaxNode[] {
    const column = this.child(index);
    return Array.from({ length: column.count }, (_, i) => column.child(i));
  }

  /** What the option at this number matched, if it did. */
  option(index: number): SyntaxNode | undefined {
    const column = this.child(index);
    return column.count > 0 ? column.child(0) : undefined;
  }
}
