import { Fragment } from 'react';
import type { Piece } from './difference';

/** Of what both versions have, so much is shown on either side of a change. */
const around = 80;
/** Of what changed, at most so much. */
const atMost = 1200;

/** What need not be read to see the change is left out. */
function shortened({ kind, text }: Piece): string {
  if (kind === 'both') return text.length <= 3 * around ? text : `${text.slice(0, around)} … ${text.slice(-around)}`;
  return text.length <= atMost ? text : `${text.slice(0, atMost)} …`;
}

/** A text with what is gone from it, or new in it, marked; screen readers hear it too. */
export function MarkedText({ pieces }: { readonly pieces: readonly Piece[] }) {
  return pieces.map((piece, index) => {
    const text = shortened(piece);
    if (piece.kind === 'both') return <Fragment key={index}>{text}</Fragment>;
    const gone = piece.kind === 'gone';
    return (
      <Fragment key={index}>
        <span className="sr">{gone ? ' taken away: ' : ' new: '}</span>
        {gone ? <del>{text.trimEnd()}</del> : <ins>{text.trimEnd()}</ins>}
        {/\s$/.test(text) ? ' ' : ''}
        <span className="sr"> end of the change </span>
      </Fragment>
    );
  });
}
