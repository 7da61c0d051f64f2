import { type EditorState, type Extension, StateField } from '@codemirror/state';
import { Decoration, type DecorationSet, EditorView } from '@codemirror/view';
import { bracketsIn, partners } from './brackets';

const partner = Decoration.mark({ class: 'line-partner' });
/** Past this many characters the partner is not looked for at each key. */
const longest = 6000;

function decorate(state: EditorState): DecorationSet {
  const { head, empty } = state.selection.main;
  if (!empty || state.doc.length > longest) return Decoration.none;
  const brackets = bracketsIn(state.doc.toString());
  // The bracket just written, to the left of the caret, comes before the one to its right.
  const behind = brackets.findIndex((bracket) => bracket.end === head);
  const here = behind >= 0 ? behind : brackets.findIndex((bracket) => bracket.start === head);
  const other = here < 0 ? undefined : partners(brackets)[here];
  const found = other === undefined ? undefined : brackets[other];
  return found ? Decoration.set(partner.range(found.start, found.end)) : Decoration.none;
}

/** Underlines the partner of the bracket at the caret. */
export const bracketPartner: Extension = StateField.define<DecorationSet>({
  create: decorate,
  update: (marks, transaction) =>
    transaction.docChanged || transaction.selection ? decorate(transaction.state) : marks,
  provide: (field) => EditorView.decorations.from(field),
});
