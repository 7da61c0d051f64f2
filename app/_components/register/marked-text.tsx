import { Fragment } from 'react';
import type { Piece } from './difference';

/** A text with what is gone from it, or new in it, marked; screen readers hear it too. */
export function MarkedText({ pieces }: { readonly pieces: readonly Piece[] }) {
  return pieces.map(({ kind, text }, index) =>
    kind === 'both' ? (
      <Fragment key={index}>{text}</Fragment>
    ) : (
      <Fragment key={index}>
        <span className="sr">{kind === 'gone' ? ' taken away: ' : ' new: '}</span>
        {kind === 'gone' ? <del>{text.trimEnd()}</del> : <ins>{text.trimEnd()}</ins>}
        {/\s$/.test(text) ? ' ' : ''}
        <span className="sr"> end of the change </span>
      </Fragment>
    ),
  );
}
