import { notFound } from 'next/navigation';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { citation } from '@/lib/register/citation';
import { identityTex } from '@/lib/register/write-tex';
import { fileResponse } from '../../../../_components/register/file-response';
import { seenIdentity } from '../../open';

interface Written {
  readonly type: string;
  readonly ending: string;
  readonly write: (identity: IdentityAnswer) => string;
}

const formats: Readonly<Record<string, Written>> = {
  tex: { type: 'application/x-tex; charset=utf-8', ending: 'tex', write: identityTex },
  bibtex: {
    type: 'application/x-bibtex; charset=utf-8',
    ending: 'bib',
    write: (identity) => citation(identity, 'bibtex'),
  },
  json: { type: 'application/json', ending: 'json', write: (identity) => JSON.stringify(identity, null, 2) },
};

/** One revision of an identity as a file, for whoever may see it. */
export async function GET(
  request: Request,
  { params }: { readonly params: Promise<{ key: string; revision: string }> },
): Promise<Response> {
  const { key, revision } = await params;
  const asked = new URL(request.url).searchParams.get('format') ?? '';
  const format = Object.hasOwn(formats, asked) ? formats[asked] : undefined;
  if (format === undefined) notFound();
  const identity = await seenIdentity(key, revision);
  return fileResponse({
    type: format.type,
    name: `${identity.key}-${identity.revision}.${format.ending}`,
    chunks: once(format.write(identity)),
  });
}

async function* once(text: string): AsyncIterable<string> {
  yield await Promise.resolve(text);
}
