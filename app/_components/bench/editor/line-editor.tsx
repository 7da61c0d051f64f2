'use client';

import { history, historyKeymap, standardKeymap } from '@codemirror/commands';
import { Compartment, EditorState, Prec } from '@codemirror/state';
import { drawSelection, EditorView, keymap } from '@codemirror/view';
import { type Ref, useEffect, useImperativeHandle, useRef, useState } from 'react';
import { type FaultSpans, setFault } from './line-fault';
import { lineMarks } from './line-marks';
import { anglePair, type Insertion, insertPiece, symbolPair } from './insertions';

/** What the page may ask of the written line. */
export interface LineHandle {
  focus(): void;
  insert(piece: Pick<Insertion, 'before' | 'after'>): void;
  /** Writes another text in place of what stands there. */
  replace(text: string): void;
  /** Writes a piece at an offset and puts the caret behind it. */
  insertAt(offset: number, text: string): void;
  /** Puts the caret at the end of the line, after writing something there. */
  append(text: string): void;
}

interface Props {
  readonly ref?: Ref<LineHandle>;
  /** What stands in the line at first. From then on the editor alone holds the text: it is replaced through the handle. */
  readonly initial: string;
  readonly onChange: (text: string) => void;
  readonly onDecide: () => void;
  readonly fault?: FaultSpans;
  readonly labelledBy: string;
  readonly describedBy: string;
}

const faultAttributes = new Compartment();

function attributes(labelledBy: string, describedBy: string, invalid: boolean) {
  return EditorView.contentAttributes.of({
    'aria-labelledby': labelledBy,
    'aria-describedby': describedBy,
    'aria-invalid': String(invalid),
    autocapitalize: 'off',
    autocorrect: 'off',
    spellcheck: 'false',
    enterkeyhint: 'enter',
    // It takes the focus without; so says it to whoever asks whether the box that scrolls can be reached.
    tabindex: '0',
  });
}

/** The nonce of the page's own scripts, under which the editor may add its style sheet. */
const pageNonce = (): string => document.querySelector<HTMLScriptElement>('script[nonce]')?.nonce ?? '';

/**
 * The line one writes on. Until the editor has been made it shows the same text in the same place, so that nothing moves; every key
 * reaches the text, whatever is being computed.
 */
export function LineEditor({ ref, initial, onChange, onDecide, fault, labelledBy, describedBy }: Props) {
  const host = useRef<HTMLDivElement>(null);
  const view = useRef<EditorView>(null);
  const calls = useRef({ onChange, onDecide });
  const [still] = useState(initial);
  const kept = useRef(initial);

  useEffect(() => {
    calls.current = { onChange, onDecide };
  });

  useEffect(() => {
    const parent = host.current;
    if (!parent) return;
    const wrap = (pair: Insertion) => (target: EditorView) => {
      insertPiece(target, pair);
      return true;
    };
    const made = new EditorView({
      parent,
      state: EditorState.create({
        doc: kept.current,
        selection: { anchor: kept.current.length },
        extensions: [
          EditorView.cspNonce.of(pageNonce()),
          history(),
          drawSelection({ cursorBlinkRate: matchMedia('(prefers-reduced-motion: reduce)').matches ? 0 : 1100 }),
          EditorView.lineWrapping,
          lineMarks,
          faultAttributes.of(attributes(labelledBy, describedBy, false)),
          EditorView.updateListener.of((update) => {
            if (update.docChanged) calls.current.onChange(update.state.doc.toString());
          }),
          Prec.high(
            keymap.of([
              { key: 'Mod-Enter', run: () => (calls.current.onDecide(), true) },
              { key: 'Alt-[', run: wrap(symbolPair) },
              { key: 'Alt-<', run: wrap(anglePair) },
              { key: 'Escape', run: (target) => (target.contentDOM.blur(), true) },
            ]),
          ),
          keymap.of([...standardKeymap, ...historyKeymap]),
        ],
      }),
    });
    view.current = made;
    return () => {
      kept.current = made.state.doc.toString();
      made.destroy();
      view.current = null;
    };
  }, [labelledBy, describedBy]);

  useEffect(() => {
    view.current?.dispatch({
      effects: [
        setFault.of(fault),
        faultAttributes.reconfigure(attributes(labelledBy, describedBy, fault !== undefined)),
      ],
    });
  }, [fault, labelledBy, describedBy]);

  useImperativeHandle(ref, () => ({
    focus: () => view.current?.focus(),
    insert: (piece) => {
      if (!view.current) return;
      insertPiece(view.current, piece);
      view.current.focus();
    },
    replace: (next) => {
      const made = view.current;
      made?.dispatch({
        changes: { from: 0, to: made.state.doc.length, insert: next },
        selection: { anchor: next.length },
        userEvent: 'input',
      });
    },
    insertAt: (offset, piece) => {
      const made = view.current;
      if (!made) return;
      const from = Math.min(offset, made.state.doc.length);
      made.dispatch({
        changes: { from, insert: piece },
        selection: { anchor: from + piece.length },
        userEvent: 'input',
      });
      made.focus();
    },
    append: (piece) => {
      const made = view.current;
      if (!made) return;
      const end = made.state.doc.length;
      made.dispatch({
        changes: { from: end, insert: piece },
        selection: { anchor: end + piece.length },
        userEvent: 'input',
      });
      made.focus();
    },
  }));

  return (
    <div className="line">
      <div className="line-made" ref={host} />
      <div className="line-still" aria-hidden="true">
        {still}
      </div>
    </div>
  );
}
