import type { EditorView } from '@codemirror/view';

/** What an insertion key writes: the text before and after the caret. */
export interface Insertion {
  readonly name: string;
  /** The key's face, in TeX. */
  readonly tex: string;
  readonly before: string;
  readonly after: string;
  /** A gap stands before this key in the row. */
  readonly apart?: boolean;
  readonly shortcut?: string;
}

export const symbolPair: Insertion = { name: 'Symbol', tex: '[\\,\\,]', before: '[', after: ']', shortcut: 'Alt+[' };
export const anglePair: Insertion = {
  name: 'Angle bracket',
  tex: '\\langle\\,\\,\\rangle',
  before: '<',
  after: '>',
  shortcut: 'Alt+<',
};

export const insertions: readonly Insertion[] = [
  symbolPair,
  anglePair,
  { name: 'Pfister bracket', tex: '\\langle\\!\\langle\\,\\rangle\\!\\rangle', before: '<<', after: '>>' },
  { name: 'Eta', tex: '\\eta', before: 'η', after: '', apart: true },
  { name: 'Epsilon', tex: '\\varepsilon', before: 'ε', after: '' },
  { name: 'Hyperbolic h', tex: 'h', before: 'h', after: '' },
  { name: 'n epsilon', tex: 'n_\\varepsilon', before: '', after: '_ε' },
  { name: 'Power', tex: 'x^n', before: '^', after: '', apart: true },
  { name: 'Quotient', tex: '\\tfrac{a}{b}', before: '', after: '/' },
];

const operandEnd = /[\p{L}\p{N})\]>⟩⟫}']$/u;

/**
 * Writes an insertion round what is chosen, or at the caret, and leaves the caret where one goes on writing: inside a pair, before `_ε`
 * or `/` when their first operand is still to be written, and after them when it stands there already.
 */
export function insertPiece(view: EditorView, piece: Pick<Insertion, 'before' | 'after'>): void {
  const { from, to } = view.state.selection.main;
  const chosen = view.state.sliceDoc(from, to);
  const behind = view.state.sliceDoc(Math.max(0, from - 1), from);
  const glue = /\p{L}$/u.test(behind) && /^\p{L}/u.test(piece.before) ? ' ' : '';
  const before = glue + piece.before;
  const closesOperand = piece.before === '' && (chosen !== '' || operandEnd.test(behind));
  const caret = from + before.length + chosen.length + (closesOperand ? piece.after.length : 0);
  view.dispatch({
    changes: { from, to, insert: before + chosen + piece.after },
    selection: { anchor: caret },
    scrollIntoView: true,
    userEvent: 'input.type',
  });
}
