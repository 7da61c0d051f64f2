import type { ReactNode } from 'react';
import { Formula } from '../math/formula';

export interface Value {
  readonly text: string;
  readonly tex: string;
}

/** whole: both sides, not zero. agree: both zero. split: the sides differ. bare: not compared. solid, none: one side only. */
export type TileState = 'whole' | 'agree' | 'split' | 'bare' | 'solid' | 'none';

/** Three firings of one glaze: neighbours differ a little. */
export type Firing = 'a' | 'b' | 'c';

/** Characters a value of this many can take before its tile shows that there is something, and the table says what. */
const fitting = { whole: 9, split: 5 };

/** A value as it is painted on a tile: itself where it fits, else that it is not zero. */
export function painted(value: Value | undefined, narrow: boolean): ReactNode {
  if (value === undefined) return null;
  const room = narrow ? fitting.split : fitting.whole;
  if (value.text.length > room) return <Formula tex="\ne 0" />;
  return /^-?\d+$/.test(value.text) && !value.text.startsWith('-') ? value.text : <Formula tex={value.tex} />;
}

export function tileClass(state: TileState, firing: Firing = 'a', value?: Value): string {
  const long = state !== 'split' && value !== undefined && value.text.length > 5 && value.text.length <= fitting.whole;
  return `tile ${state}${state === 'whole' && firing !== 'a' ? ` ${firing}` : ''}${long ? ' fits-less' : ''}`;
}

/** What is painted on a tile. */
export function TileFace({
  state,
  left,
  right,
  small = false,
}: {
  state: TileState;
  left?: Value;
  right?: Value;
  small?: boolean;
}) {
  if (state === 'bare') return <>?</>;
  if (state === 'agree' || state === 'none') return <>0</>;
  if (state === 'split') {
    return (
      <>
        <span>{painted(left, true)}</span>
        <span>{painted(right, true)}</span>
      </>
    );
  }
  return <>{painted(left ?? right, small)}</>;
}
