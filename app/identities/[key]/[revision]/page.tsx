import type { Metadata } from 'next';
import { currentCaller } from '@/lib/people/current';
import { citation } from '@/lib/register/citation';
import { IdentityPage } from '../../../_components/register/identity/identity-page';
import { seenIdentity, viewerOf } from '../open';

interface Props {
  readonly params: Promise<{ key: string; revision: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { key, revision } = await params;
  const { name } = await seenIdentity(key, revision);
  return { title: `${name}, revision ${revision}` };
}

/** An identity as it was in one of its revisions. */
export default async function RevisionPage({ params }: Props) {
  const { key, revision } = await params;
  const identity = await seenIdentity(key, revision);
  return (
    <IdentityPage
      identity={identity}
      viewer={viewerOf(await currentCaller(), identity)}
      bibtex={citation(identity, 'bibtex').trimEnd()}
      tex={citation(identity, 'tex').trimEnd()}
    />
  );
}
