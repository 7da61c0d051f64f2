import { notFound } from 'next/navigation';
import { isAnswer } from '@/lib/compute/request';
import { exportQuery } from '@/lib/contracts/identity-query';
import { requireMember } from '@/lib/people/current';
import { exportIdentities } from '@/lib/register/export';
import { fileResponse } from '../../_components/register/file-response';

/** The register under the filters of the address, as a file. */
export async function GET(request: Request): Promise<Response> {
  const { pathname, search, searchParams } = new URL(request.url);
  const member = await requireMember('register-read', `${pathname}${search}`);
  const given = [...searchParams].filter(([, value]) => value !== '');
  const query = exportQuery.safeParse(Object.fromEntries(given));
  if (!query.success) notFound();
  const file = await exportIdentities(member, query.data);
  if (!isAnswer(file)) notFound();
  return fileResponse(file.answer);
}
