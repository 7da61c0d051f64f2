'use client';

import { useEffect, useRef, useState } from 'react';
import { Button } from '../button/button';
import { Slip } from '../slip/slip';

export interface MadeToken {
  readonly id: string;
  readonly name: string;
  readonly secret: string;
}

/** The one place and the one time where a token can be read. It stays until it is closed. */
export function ShownOnce({ token, onClose }: { token: MadeToken; onClose: () => void }) {
  const [copied, setCopied] = useState<boolean>();
  const place = useRef<HTMLDivElement>(null);
  useEffect(() => place.current?.querySelector<HTMLElement>('.btn')?.focus(), []);
  const copy = () => {
    navigator.clipboard.writeText(token.secret).then(
      () => setCopied(true),
      () => setCopied(false),
    );
  };
  return (
    <div className="form-slip token-slip" ref={place}>
      <Slip
        kind="good"
        onClose={onClose}
        action={<Button onClick={copy}>{copied === true ? 'Copied' : 'Copy'}</Button>}
      >
        <span>The token “{token.name}” is made. It is shown this once: keep it where only the script can read it.</span>
        <code className="secret">{token.secret}</code>
        {copied === false && <span>This browser does not let the page copy. Choose the text and copy it by hand.</span>}
      </Slip>
    </div>
  );
}
