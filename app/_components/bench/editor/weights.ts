import type { Extension } from '@codemirror/state';
import { Decoration, type DecorationSet, EditorView, ViewPlugin, type ViewUpdate } from '@codemirror/view';
import { bracketsIn } from './brackets';

const bracket = Decoration.mark({ class: 'line-bracket' });

function decorate(view: EditorView): DecorationSet {
  return Decoration.set(
    view.visibleRanges.flatMap(({ from, to }) =>
      bracketsIn(view.state.sliceDoc(from, to)).map(({ start, end }) => bracket.range(from + start, from + end)),
    ),
  );
}

/** No colours for syntax, weight only: brackets step back, what stands in them is ink. */
export const weights: Extension = ViewPlugin.fromClass(
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
);
