'use client';

import { useState } from 'react';
import { Button } from '../../button/button';
import { Formula } from '../../math/formula';

/** Past this much TeX a formula is shown as text first: setting it would take the time of many keys. */
const settable = 4000;

interface Props {
  readonly text: string;
  readonly tex: string;
}

/** A formula that may be very long: then its text stands in a place that scrolls, and it is set when asked. */
export function LongFormula({ text, tex }: Props) {
  const [asked, setAsked] = useState<string>();
  if (tex.length <= settable || asked === tex) return <Formula tex={tex} breaks />;
  return (
    <span className="long-formula">
      <span className="long-text" tabIndex={0} role="group" aria-label="Long formula, as text">
        {text}
      </span>
      <span className="small quiet">
        {text.length.toLocaleString('en-GB')} characters, shown as text.{' '}
        <Button kind="plain" onClick={() => setAsked(tex)}>
          Set it
        </Button>
      </span>
    </span>
  );
}
