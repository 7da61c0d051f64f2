import type { Span } from '../engine/expression/span';

/** Something that could stand at the place of an error; `insert` is the text that would be put there. */
export interface Expected {
  readonly text: string;
  readonly insert?: string;
}

/** What is wrong and where, before lines and columns are counted. */
export interface Fault {
  /** One or two sentences, without the place. */
  readonly detail: string;
  /** UTF-16 offset at which the error is shown. */
  readonly offset: number;
  readonly offending: string;
  readonly expected: readonly Expected[];
  /** The bracket that is still open, from its opening sign to the place of the error. */
  readonly open?: Span;
}

/** More characters of a line than this are not shown around the caret. */
const excerptReach = 60;

/**
 * Text that cannot be read. Lines and columns count from 1, columns in characters (code points).
 *
 * `message` begins with the place ("Column 19. The bracket <3 is still open where = stands."), `detail` is the same without
 * it; `excerpt` is the line and, under it, the line with the caret.
 */
export class ReadingError extends Error {
  override readonly name = 'ReadingError';
  readonly line: number;
  readonly column: number;
  readonly offset: number;
  readonly detail: string;
  readonly offending: string;
  readonly expected: readonly Expected[];
  readonly excerpt: string;
  readonly open?: Span;

  constructor(text: string, fault: Fault) {
    const before = text.slice(0, fault.offset).split(/\r\n|\n|\r/);
    const line = before.length;
    const start = before[line - 1] ?? '';
    const column = [...start].length + 1;
    super(`${/[\r\n]/.test(text.trimEnd()) ? `Line ${line}, column ${column}.` : `Column ${column}.`} ${fault.detail}`);
    const rest = text.slice(fault.offset).split(/\r\n|\n|\r/, 1)[0] ?? '';
    this.line = line;
    this.column = column;
    this.offset = fault.offset;
    this.detail = fault.detail;
    this.offending = fault.offending;
    this.expected = fault.expected;
    this.excerpt = excerpt([...start], [...rest]);
    this.open = fault.open;
  }
}

function excerpt(before: readonly string[], after: readonly string[]): string {
  const left = before.length > excerptReach ? ['…', ...before.slice(-excerptReach)] : before;
  const right = after.length > excerptReach ? [...after.slice(0, excerptReach), '…'] : after;
  const pad = left.map((c) => (c === '\t' ? '\t' : ' ')).join('');
  return `${left.join('')}${right.join('')}\n${pad}^`;
}
