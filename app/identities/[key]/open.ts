import { notFound } from 'next/navigation';
import { cache } from 'react';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import type { Caller } from '@/lib/people/caller';
import { currentCaller } from '@/lib/people/current';
import { may } from '@/lib/permissions';
import { openIdentity } from '@/lib/register/open';
import type { Viewer } from '../../_components/register/identity/viewer';

/** The identity under a key as whoever asks may see it, at a revision if one is named; read once a request. */
export const seenIdentity = cache(async (key: string, revision?: string): Promise<IdentityAnswer> => {
  if (revision !== undefined && !/^[1-9]\d{0,8}$/.test(revision)) notFound();
  const identity = await openIdentity(
    await currentCaller(),
    key,
    revision === undefined ? undefined : Number(revision),
  );
  if (identity === undefined) notFound();
  return identity;
});

/** What the caller may do with an identity. */
export function viewerOf(caller: Caller, identity: IdentityAnswer): Viewer {
  const own = caller.kind === 'member' && caller.group.slug === identity.group.slug;
  return { own, mayWrite: own && may(caller, 'identity-write') };
}
