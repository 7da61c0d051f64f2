'use client';

import { useState } from 'react';
import { Button } from '../../button/button';
import { copyText } from '../../clipboard/copy-text';

interface Props {
  readonly bibtex: string;
  readonly tex: string;
}

/** How to cite it, for either kind of bibliography. */
export function Citations({ bibtex, tex }: Props) {
  const [told, setTold] = useState('');
  const copy = (what: string, text: string) => () => void copyText(what, text).then(setTold);
  return (
    <div className="cites">
      <pre className="cite">{bibtex}</pre>
      <pre className="cite">{tex}</pre>
      <p className="acts">
        <Button kind="plain" onClick={copy('the entry for BibTeX', bibtex)}>
          Copy for BibTeX
        </Button>
        <Button kind="plain" onClick={copy('the entry for TeX', tex)}>
          Copy for TeX
        </Button>
        <span className="small quiet" role="status">
          {told}
        </span>
      </p>
    </div>
  );
}
