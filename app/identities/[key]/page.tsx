import type { Metadata } from 'next';
import { currentCaller } from '@/lib/people/current';
import { citation } from '@/lib/register/citation';
import { IdentityPage } from '../../_components/register/identity/identity-page';
import { seenIdentity, viewerOf } from './open';

interface Props {
  readonly params: Promise<{ key: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { name } = await seenIdentity((await params).key);
  return { title: name };
}

/** An identity as it is now. */
export default async function CurrentIdentityPage({ params }: Props) {
  const identity = await seenIdentity((await params).key);
  return (
    <IdentityPage
      identity={identity}
      viewer={viewerOf(await currentCaller(), identity)}
      bibtex={citation(identity, 'bibtex').trimEnd()}
      tex={citation(identity, 'tex').trimEnd()}
    />
  );
}
