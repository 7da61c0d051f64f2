'use client';

import { useState, useTransition } from 'react';
import { recheck } from '@/app/identities/actions';
import { Button } from '../../button/button';

/** Has the current revision checked by the engine of today. */
export function CheckAgain({ identityKey }: { readonly identityKey: string }) {
  const [told, setTold] = useState('');
  const [checking, check] = useTransition();
  const act = () =>
    check(async () => {
      const outcome = await recheck(identityKey).catch(() => undefined);
      setTold(outcome?.done ?? outcome?.fault ?? 'The server did not answer. Try again in a moment.');
    });
  return (
    <>
      <Button kind="plain" aria-busy={checking} onClick={checking ? undefined : act}>
        Check again
      </Button>
      <span className="small quiet" role="status">
        {checking ? 'Checking it.' : told}
      </span>
    </>
  );
}
