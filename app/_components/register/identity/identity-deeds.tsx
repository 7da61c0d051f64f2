'use client';

import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { show } from '@/app/identities/actions';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { Button } from '../../button/button';
import { useKey } from '../../keys/keys-provider';
import { registerHref } from '../address';
import { copyText } from '../../clipboard/copy-text';
import { OpenOnBench } from './open-on-bench';
import type { Viewer } from './viewer';

interface Props {
  readonly identityKey: string;
  readonly revision: number;
  readonly past: boolean;
  readonly text: string;
  readonly tex: string;
  /** What the bench is opened with. */
  readonly field: string;
  readonly line: string;
  readonly visibility: IdentityAnswer['visibility'];
  readonly tags: readonly string[];
  readonly viewer: Viewer;
}

const formats = [
  ['tex', 'TeX'],
  ['bibtex', 'BibTeX'],
  ['json', 'JSON'],
] as const;

/** What can be taken from the page, who sees it, and under which tags it stands. */
export function IdentityDeeds(props: Props) {
  const { identityKey, revision, past, text, tex, field, line, visibility, tags, viewer } = props;
  const router = useRouter();
  const [told, setTold] = useState('');
  const [busy, setBusy] = useState(false);
  const act = (deed: () => Promise<string>) => () => void deed().then(setTold);
  const asText = act(() => copyText('as text', text));
  const asTex = act(() => copyText('as TeX', tex));
  const link = `/identities/${identityKey}${past ? `/${revision}` : ''}`;
  const asLink = act(() => copyText(`the link ${link}`, `${window.location.origin}${link}`));
  useKey({ keyName: 'C', label: 'copy as text', act: asText });
  useKey({ keyName: 'T', label: 'copy as TeX', act: asTex });
  useKey({ keyName: 'L', label: 'copy the link', act: asLink });
  useKey({
    keyName: 'M',
    label: 'look for an identity',
    act: () => router.push('/register'),
    enabled: viewer.own,
  });
  const other = visibility === 'public' ? 'group' : 'public';
  const change = act(async () => {
    setBusy(true);
    const outcome = await show(identityKey, other).catch(() => undefined);
    setBusy(false);
    return outcome?.done ?? outcome?.fault ?? 'The server did not answer. Try again in a moment.';
  });
  return (
    <div className="deeds">
      <p className="acts">
        <span className="it quiet">copy</span>
        <Button kind="plain" keyName="C" tip="Copy as text" onClick={asText}>
          text
        </Button>
        <Button kind="plain" keyName="T" tip="Copy as TeX" onClick={asTex}>
          TeX
        </Button>
        <Button kind="plain" keyName="L" tip="Copy the link" tipSide="right" onClick={asLink}>
          link
        </Button>
      </p>
      <p className="acts">
        <span className="it quiet">write out</span>
        {formats.map(([format, name]) => (
          <a
            key={format}
            className="plain"
            href={`/identities/${identityKey}/${revision}/write-out?format=${format}`}
            download
          >
            {name}
          </a>
        ))}
      </p>
      <p className="acts">
        <span className="it quiet">shown to</span>
        <span>{visibility === 'public' ? 'anyone with the link' : 'the group'}</span>
        {viewer.mayWrite && !past && (
          <Button kind="plain" aria-busy={busy} className="quietly" onClick={change}>
            {visibility === 'public' ? 'show to the group alone' : 'show to anyone'}
          </Button>
        )}
      </p>
      {tags.length > 0 && (
        <p className="acts tags">
          <span className="it quiet">tags</span>
          {tags.map((tag) =>
            viewer.own ? (
              <Link key={tag} href={registerHref({}, { tag })}>
                {tag}
              </Link>
            ) : (
              <span key={tag}>{tag}</span>
            ),
          )}
        </p>
      )}
      <p className="acts">
        <OpenOnBench field={field} line={line} />
      </p>
      <p className="small quiet told" role="status">
        {told}
      </p>
    </div>
  );
}
