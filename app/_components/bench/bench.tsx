'use client';

import './sheet/sheet.css';
import './slab/slab.css';
import { useMemo } from 'react';
import { Button } from '../button/button';
import { Slip } from '../slip/slip';
import { Announcer } from './announcer';
import { AskClient } from './ask-client';
import type { Draft } from './drafts';
import { MayKeep } from './keeping';
import { Sheet } from './sheet/sheet';
import { SlabRow } from './slab/slab-row';
import { useBench } from './use-bench';
import { useDraft } from './use-draft';

interface Props {
  /** What the address opens; undefined for the bare bench. */
  readonly opened: Draft | undefined;
  /** Whether a statement may be kept in the register from here; a visitor is asked to sign in there. */
  readonly mayKeep: boolean;
}

function OpenBench({ opened }: Pick<Props, 'opened'>) {
  const bench = useBench(opened);
  const { field, text, edited, write } = bench;
  const now = useMemo(() => ({ field, statement: text }), [field, text]);
  const { offered, goOn, leave } = useDraft(opened, now, edited, write);
  return (
    <>
      <section className="slab bench-slab" aria-label="What is asked">
        <h1 className="sr">Bench</h1>
        {offered && (
          <div className="bench-slip">
            <Slip
              kind="ask"
              onClose={leave}
              action={
                <Button kind="plain" onClick={goOn}>
                  Go on with it
                </Button>
              }
            >
              Your text was kept on this device.
            </Slip>
          </div>
        )}
        <SlabRow bench={bench} label="Statement or expression" />
      </section>
      <Sheet bench={bench} />
      <Announcer asked={bench.asked} />
    </>
  );
}

/** The bench: one statement or expression at a time, answered as it is typed. */
export function Bench({ opened, mayKeep }: Props) {
  return (
    <AskClient>
      <MayKeep value={mayKeep}>
        <OpenBench opened={opened} />
      </MayKeep>
    </AskClient>
  );
}
