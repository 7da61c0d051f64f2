import { type Extension, type Range, StateEffect, StateField } from '@codemirror/state';
import { Decoration, type DecorationSet, EditorView, WidgetType } from '@codemirror/view';

/** Where the line could not be read: the offending stretch and what is still open, as offsets in UTF-16 units. */
export interface FaultSpans {
  readonly start: number;
  readonly end: number;
  readonly open?: { readonly start: number; readonly end: number };
}

export const setFault = StateEffect.define<FaultSpans | undefined>();

/** Stands where something is missing: at the end of a line there is no character to reverse. */
class MissingMark extends WidgetType {
  override toDOM(): HTMLElement {
    const mark = document.createElement('span');
    mark.className = 'line-bad';
    mark.textContent = '\u00a0';
    mark.setAttribute('aria-hidden', 'true');
    return mark;
  }
  override eq(): boolean {
    return true;
  }
}

const bad = Decoration.mark({ class: 'line-bad' });
const open = Decoration.mark({ class: 'line-open' });
const missing = Decoration.widget({ widget: new MissingMark(), side: 1 });

function decorate(fault: FaultSpans | undefined, text: string): DecorationSet {
  if (!fault) return Decoration.none;
  const marks: Range<Decoration>[] = [];
  const start = Math.min(fault.start, text.length);
  const end = Math.min(Math.max(fault.end, start), text.length);
  if (fault.open && fault.open.end > fault.open.start && fault.open.start < text.length)
    marks.push(open.range(fault.open.start, Math.min(fault.open.end, text.length)));
  const stretch = text.slice(start, end);
  marks.push(stretch === '' || /^[\r\n]/.test(stretch) ? missing.range(start) : bad.range(start, end));
  return Decoration.set(marks, true);
}

/** Marks the place of an error in the line; the marks move with the text until the next reading replaces them. */
export const faultMarks: Extension = StateField.define<DecorationSet>({
  create: () => Decoration.none,
  update(marks, transaction) {
    let next = marks.map(transaction.changes);
    for (const effect of transaction.effects)
      if (effect.is(setFault)) next = decorate(effect.value, transaction.state.doc.toString());
    return next;
  },
  provide: (field) => EditorView.decorations.from(field),
});
