'use client';

import { useState } from 'react';
import { makeLink } from '@/app/bench/actions';
import { Button } from '../../button/button';
import { copyText } from '../../clipboard/copy-text';
import { useKey } from '../../keys/keys-provider';

interface Props {
  readonly field: string;
  /** What the link reopens: the line as it was asked. */
  readonly line: string;
  readonly text: string;
  readonly tex: string;
  /** The one thing that this answer calls for. */
  readonly repair?: React.ReactNode;
}

/** What can be done with an answer: copy it as text or TeX, or a link that opens the same statement again. */
export function Deeds({ field, line, text, tex, repair }: Props) {
  const [told, setTold] = useState('');
  const act = (deed: () => Promise<string>) => () => void deed().then(setTold);
  const asText = act(() => copyText('as text', text));
  const asTex = act(() => copyText('as TeX', tex));
  const asLink = act(async () => {
    try {
      const path = await makeLink(field, line);
      if (path === undefined) return 'This is too long for a link.';
      return await copyText(`the link ${path}`, `${window.location.origin}${path}`);
    } catch {
      return 'The link could not be made: no answer came. Your text is kept on this device.';
    }
  });
  useKey({ keyName: 'C', label: 'copy as text', act: asText });
  useKey({ keyName: 'T', label: 'copy as TeX', act: asTex });
  useKey({ keyName: 'L', label: 'copy the link', act: asLink });
  return (
    <div className="deeds">
      {repair}
      <p className="acts">
        <span className="it quiet">copy</span>
        <Button kind="plain" keyName="C" tip="Copy as text" onClick={asText}>
          text
        </Button>
        <Button kind="plain" keyName="T" tip="Copy as TeX" onClick={asTex}>
          TeX
        </Button>
        <Button kind="plain" keyName="L" tip="Copy a link that opens this again" tipSide="right" onClick={asLink}>
          link
        </Button>
      </p>
      <p className="small quiet told" role="status">
        {told}
      </p>
    </div>
  );
}
