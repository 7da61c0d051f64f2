import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { openLink } from '@/lib/links/links';
import { requireMember } from '@/lib/people/current';
import { openDraft } from '@/lib/register/drafts';
import { IdentityWriting } from '../../_components/register/writing/identity-writing';
import { emptyForm } from '../../_components/register/writing/form-values';
import { Colophon } from '../../_components/shell/colophon';
import { keep } from '../actions';

export const metadata: Metadata = { title: 'Keep an identity' };

interface Props {
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>;
}

const one = (value: string | string[] | undefined): string | undefined => (Array.isArray(value) ? value[0] : value);

/** The form that keeps an identity, with the statement that the address brings: by itself, or by the code of a link. */
export default async function KeepPage({ searchParams }: Props) {
  const given = await searchParams;
  const asked = Object.entries(given).flatMap(([key, value]) => {
    const text = one(value);
    return text === undefined ? [] : [[key, text]];
  });
  const search = new URLSearchParams(asked).toString();
  const member = await requireMember('identity-write', search === '' ? '/register/keep' : `/register/keep?${search}`);
  const [field, statement, code] = [one(given.field), one(given.statement), one(given.code)];
  const linked = code === undefined ? undefined : await openLink(code);
  if (code !== undefined && linked === undefined) notFound();
  const kept = await openDraft(member.person.id, 'keep');
  const bare = linked === undefined && statement === undefined;
  const start = {
    ...emptyForm,
    ...(bare && kept ? kept.draft.form : {}),
    ...(field === undefined ? {} : { field: field.slice(0, 500) }),
    ...(statement === undefined ? {} : { statement }),
    ...linked,
    ...(one(given.kind) === 'residue' ? { kind: 'residue' as const } : {}),
  };
  return (
    <>
      <IdentityWriting
        key={search}
        draftKey="keep"
        start={start}
        drafted={kept?.draft}
        side="to keep"
        title="Keep an identity"
        send={keep}
        leave={
          <Link className="plain" href="/register">
            Leave it
          </Link>
        }
      />
      <Colophon />
    </>
  );
}
