import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { requireMember } from '@/lib/people/current';
import { openDraft } from '@/lib/register/drafts';
import { identityHref, reviseHref } from '../../../_components/register/identity-address';
import { formOf } from '../../../_components/register/writing/form-values';
import { IdentityWriting } from '../../../_components/register/writing/identity-writing';
import { Colophon } from '../../../_components/shell/colophon';
import { revise } from '../../actions';
import { seenIdentity, viewerOf } from '../open';

export const metadata: Metadata = { title: 'Revise an identity' };

interface Props {
  readonly params: Promise<{ key: string }>;
}

/** The form in which a new revision is written, filled with the current one. */
export default async function RevisePage({ params }: Props) {
  const { key } = await params;
  const member = await requireMember('identity-write', reviseHref(key));
  const identity = await seenIdentity(key);
  if (!viewerOf(member, identity).mayWrite) notFound();
  const draftKey = `revise:${identity.key}`;
  const kept = await openDraft(member.person.id, draftKey);
  return (
    <>
      <IdentityWriting
        draftKey={draftKey}
        start={formOf(identity, identity.visibility)}
        base={identity.current}
        drafted={kept?.draft}
        side={`identity ${identity.number}`}
        title={`Revise ${identity.name}`}
        send={revise.bind(null, identity.key)}
        leave={
          <Link className="plain" href={identityHref(identity.key)}>
            Leave it
          </Link>
        }
      />
      <Colophon />
    </>
  );
}
