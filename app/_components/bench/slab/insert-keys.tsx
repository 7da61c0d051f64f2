import { Fragment, type KeyboardEvent } from 'react';
import { Formula } from '../../math/formula';
import { type Insertion, insertions } from '../editor/insertions';

/** Left and right walk the row; it is one stop of the tab key. */
function walk(event: KeyboardEvent<HTMLDivElement>) {
  const step = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0;
  if (step === 0) return;
  const keys = Array.from(event.currentTarget.querySelectorAll('button'));
  const here = keys.findIndex((key) => key === document.activeElement);
  const next = keys[(here + step + keys.length) % keys.length];
  if (!next) return;
  for (const key of keys) key.tabIndex = key === next ? 0 : -1;
  next.focus();
  event.preventDefault();
}

/** The row of insertion keys under the line. A press writes the sign and leaves the caret inside it. */
export function InsertKeys({ onInsert }: { readonly onInsert: (piece: Insertion) => void }) {
  return (
    <div className="keys" role="toolbar" aria-label="Insert" onKeyDown={walk}>
      {insertions.map((piece, index) => (
        <Fragment key={piece.name}>
          {piece.apart && <span className="gap" />}
          <button
            type="button"
            tabIndex={index === 0 ? 0 : -1}
            aria-label={piece.name}
            title={piece.shortcut ? `${piece.name} (${piece.shortcut})` : piece.name}
            onMouseDown={(event) => event.preventDefault()}
            onClick={() => onInsert(piece)}
          >
            <Formula tex={piece.tex} />
          </button>
        </Fragment>
      ))}
    </div>
  );
}
