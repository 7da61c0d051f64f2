import { auditFilterOf } from '@/lib/audit/filter';
import { everyAudit } from '@/lib/audit/list';
import { auditFormats, isAuditFormat } from '@/lib/audit/write-out';
import { byteStream } from '@/lib/http/sent-file';
import { memberWho } from '@/lib/people/current';

const nothing = () => new Response('There is nothing here that you can see.\n', { status: 404 });

/** The trail of the steward's group as a file: everything that the filter of the page leaves, sent as it is read. */
export async function GET(request: Request): Promise<Response> {
  const member = await memberWho('audit-read');
  const { searchParams } = new URL(request.url);
  const format = searchParams.get('format');
  if (member === undefined || !isAuditFormat(format)) return nothing();
  const { type, write } = auditFormats[format];
  const filter = auditFilterOf(Object.fromEntries(searchParams));
  const body = byteStream(write(everyAudit(member.group.id, filter)));
  return new Response(body, {
    headers: {
      'Content-Type': type,
      'Content-Disposition': `attachment; filename="audit-${member.group.slug}.${format}"`,
      'Cache-Control': 'no-store',
    },
  });
}
