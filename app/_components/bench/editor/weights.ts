import type { Extension, Range } from '@codemirror/state';
import { Decoration, type DecorationSet, type EditorView, ViewPlugin, type ViewUpdate } from '@codemirror/view';
import { lineTokens, tokenIndexAt } from './line-tokens';

const bracket = Decoration.mark({ class: 'line-bracket' });

function decorate(view: EditorView): DecorationSet {
  const tokens = view.state.field(lineTokens);
  const marks: Range<Decoration>[] = [];
  for (const { from, to } of view.visibleRanges) {
    for (let index = tokenIndexAt(tokens, from); index < tokens.length; index += 1) {
      const token = tokens[index];
      if (!token || token.start >= to) break;
      if (token.kind === 'open' || token.kind === 'close') marks.push(bracket.range(token.start, token.end));
    }
  }
  return Decoration.set(marks, true);
}

/** No colours for syntax, weight only: brackets step back, what stands in them is ink. */
export const weights: Extension = [
  lineTokens,
  ViewPlugin.fromClass(
    class {
      marks: DecorationSet;
      constructor(view: EditorView) {
        this.marks = decorate(view);
      }
      update(update: ViewUpdate) {
        if (update.docChanged || update.viewportChanged) this.marks = decorate(update.view);
      }
    },
    { decorations: (plugin) => plugin.marks },
  ),
];
