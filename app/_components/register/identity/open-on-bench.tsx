'use client';

import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { makeLink } from '@/app/bench/actions';
import { benchAddress } from '../../bench/bench-address';
import { Button } from '../../button/button';

/** An address longer than this is not carried everywhere; past it the statement travels under a code. */
const longestAddress = 1500;

type Href = Parameters<ReturnType<typeof useRouter>['push']>[0];

/** The bench, with what an identity says in its line. */
export function OpenOnBench({ field, line }: { readonly field: string; readonly line: string }) {
  const router = useRouter();
  const address = benchAddress(field, line);
  if (address.length <= longestAddress)
    return (
      <Link className="plain quietly" href={address}>
        Open on the bench
      </Link>
    );
  const open = async () => {
    const path = await makeLink(field, line);
    if (path !== undefined) router.push(path as Href);
  };
  return (
    <Button kind="plain" className="quietly" onClick={() => void open()}>
      Open on the bench
    </Button>
  );
}
