import { type EditorState, type Extension, StateField } from '@codemirror/state';
import { Decoration, type DecorationSet, EditorView } from '@codemirror/view';
import { bracketPartners, type Token } from '@/grammar/tokens';
import { lineTokens } from './line-tokens';

const partner = Decoration.mark({ class: 'line-partner' });

const isBracket = (token: Token): boolean => token.kind === 'open' || token.kind === 'close';

function decorate(state: EditorState): DecorationSet {
  const { head, empty } = state.selection.main;
  const tokens = state.field(lineTokens);
  if (!empty) return Decoration.none;
  // The bracket just written, to the left of the caret, comes before the one to its right.
  const behind = tokens.findIndex((token) => token.end === head && isBracket(token));
  const here = behind >= 0 ? behind : tokens.findIndex((token) => token.start === head && isBracket(token));
  const other = here < 0 ? undefined : bracketPartners(tokens)[here];
  const found = other === undefined ? undefined : tokens[other];
  return found ? Decoration.set(partner.range(found.start, found.end)) : Decoration.none;
}

/** Underlines the partner of the bracket at the caret. */
export const bracketPartner: Extension = [
  lineTokens,
  StateField.define<DecorationSet>({
    create: decorate,
    update: (marks, transaction) =>
      transaction.docChanged || transaction.selection ? decorate(transaction.state) : marks,
    provide: (field) => EditorView.decorations.from(field),
  }),
];
