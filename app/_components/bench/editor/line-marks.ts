import { type EditorState, type Extension, type Range } from '@codemirror/state';
import {
  Decoration,
  type DecorationSet,
  type EditorView,
  ViewPlugin,
  type ViewUpdate,
  WidgetType,
} from '@codemirror/view';
import { bracketPartners, type Token } from '@/grammar/tokens';
import { lineFault } from './line-fault';
import { lineTokens, tokenIndexAt } from './line-tokens';

interface Stretch {
  readonly start: number;
  readonly end: number;
  readonly mark: 'line-bracket' | 'line-partner' | 'line-open' | 'line-bad';
}

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

const missing = Decoration.widget({ widget: new MissingMark(), side: 1 });

const isBracket = (token: Token): boolean => token.kind === 'open' || token.kind === 'close';

/** The partner of the bracket at the caret; the one to its left, just written, comes before the one to its right. */
function partnerAtCaret(state: EditorState): Stretch | undefined {
  const { head, empty } = state.selection.main;
  const tokens = state.field(lineTokens);
  if (!empty) return undefined;
  const behind = tokens.findIndex((token) => token.end === head && isBracket(token));
  const here = behind >= 0 ? behind : tokens.findIndex((token) => token.start === head && isBracket(token));
  const other = here < 0 ? undefined : bracketPartners(tokens)[here];
  const found = other === undefined ? undefined : tokens[other];
  return found && { start: found.start, end: found.end, mark: 'line-partner' };
}

function faultStretches(state: EditorState): Stretch[] {
  const fault = state.field(lineFault);
  if (!fault) return [];
  const bad: Stretch = { start: fault.start, end: fault.end, mark: 'line-bad' };
  return fault.open ? [{ ...fault.open, mark: 'line-open' }, bad] : [bad];
}

/** Cuts overlapping stretches at each other's ends, so that every character lies in one span that carries all its marks. */
function flat(stretches: readonly Stretch[], length: number): Range<Decoration>[] {
  const inside = stretches
    .map(({ start, end, mark }) => ({ start: Math.max(0, start), end: Math.min(end, length), mark }))
    .filter(({ start, end }) => start < end);
  const cuts = [...new Set(inside.flatMap(({ start, end }) => [start, end]))].sort((a, b) => a - b);
  const open = [...inside].sort((a, b) => a.start - b.start);
  let next = 0;
  let here: Stretch[] = [];
  return cuts.slice(0, -1).flatMap((from, index) => {
    for (; next < open.length && (open[next]?.start ?? 0) <= from; next += 1) here.push(open[next] as Stretch);
    here = here.filter(({ end }) => end > from);
    const marks = [...new Set(here.map(({ mark }) => mark))].sort();
    return marks.length === 0 ? [] : [Decoration.mark({ class: marks.join(' ') }).range(from, cuts[index + 1] ?? from)];
  });
}

function brackets(view: EditorView): Stretch[] {
  const tokens = view.state.field(lineTokens);
  const found: Stretch[] = [];
  for (const { from, to } of view.visibleRanges) {
    for (let index = tokenIndexAt(tokens, from); index < tokens.length; index += 1) {
      const token = tokens[index];
      if (!token || token.start >= to) break;
      if (isBracket(token)) found.push({ start: token.start, end: token.end, mark: 'line-bracket' });
    }
  }
  return found;
}

function decorate(view: EditorView): DecorationSet {
  const { state } = view;
  const partner = partnerAtCaret(state);
  const marks = flat([...brackets(view), ...(partner ? [partner] : []), ...faultStretches(state)], state.doc.length);
  const fault = state.field(lineFault);
  const at = fault && Math.min(fault.start, state.doc.length);
  const nothingThere = at !== undefined && /^[\r\n]?$/.test(state.sliceDoc(at, at + 1));
  return Decoration.set(nothingThere ? [...marks, missing.range(at)] : marks, true);
}

/**
 * What is marked in the line: brackets step back (weight only, no colours for syntax), the partner of the bracket at the caret is
 * underlined, what is still open too, and the place of an error is reversed. All in one flat layer: spans within spans that come and
 * go as one types mislead browsers about where the caret is.
 */
export const lineMarks: Extension = [
  lineTokens,
  lineFault,
  ViewPlugin.fromClass(
    class {
      marks: DecorationSet;
      constructor(view: EditorView) {
        this.marks = decorate(view);
      }
      update(update: ViewUpdate) {
        const faultChanged = update.startState.field(lineFault) !== update.state.field(lineFault);
        if (update.docChanged || update.viewportChanged || update.selectionSet || faultChanged)
          this.marks = decorate(update.view);
      }
    },
    { decorations: (plugin) => plugin.marks },
  ),
];
