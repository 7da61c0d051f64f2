import type { Metadata, Route } from 'next';
import Link from 'next/link';
import { auditFilterOf, auditQuery, isNarrowed } from '@/lib/audit/filter';
import { auditPeople, listAudit } from '@/lib/audit/list';
import { requireMember } from '@/lib/people/current';
import { AuditFilterForm } from '../../_components/audit/audit-filter-form';
import { AuditLedger } from '../../_components/audit/audit-ledger';
import { Colophon } from '../../_components/shell/colophon';
import { Row } from '../../_components/shell/row';

type Asked = { searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>> };

export const metadata: Metadata = { title: 'What was done' };

/** Who did what in the group, and when: for stewards. */
export default async function Audit({ searchParams }: Asked) {
  const member = await requireMember('audit-read', '/group/audit');
  const asked = onlyTexts(await searchParams);
  const filter = auditFilterOf(asked);
  const { group } = member;
  const place = asked.after === undefined ? { before: asked.before } : { after: asked.after };
  const [page, people] = await Promise.all([listAudit(group.id, filter, place), auditPeople(group.id)]);
  const at = (more: Readonly<Record<string, string>>) => `/group/audit?${auditQuery(filter, more)}` as Route;
  return (
    <>
      <section className="slab" aria-label="What is asked">
        <div className="row">
          <p className="side to-title">audit</p>
          <div>
            <h1 className="text-title mb-4">What was done in {group.name}</h1>
            <AuditFilterForm key={auditQuery(filter)} filter={filter} people={people} />
          </div>
        </div>
      </section>
      <main className="sheet" id="sheet" tabIndex={-1}>
        <Row side={isNarrowed(filter) ? 'of it' : 'deeds'} sideClass="to-table" id="deeds" className="">
          {page.entries.length === 0 ? (
            <p className="lead">
              {isNarrowed(filter) ? (
                <>
                  Nothing like that was done. <Link href="/group/audit">See everything</Link>
                </>
              ) : (
                'Nothing was done yet. Whatever changes the group or its register is written down here.'
              )}
            </p>
          ) : (
            <AuditLedger entries={page.entries} name={group.name} />
          )}
          <p className="acts mt-4">
            {page.newer !== undefined && <Link href={at({ after: page.newer })}>Newer</Link>}
            {page.older !== undefined && <Link href={at({ before: page.older })}>Older</Link>}
          </p>
        </Row>
        {page.entries.length > 0 && (
          <Row side="write out" id="write-out" sideClass="to-lead">
            <p className="text acts">
              <a href={`/group/audit/export?${auditQuery(filter, { format: 'csv' })}`}>CSV</a>
              <a href={`/group/audit/export?${auditQuery(filter, { format: 'json' })}`}>JSON</a>
              <span className="quiet">
                All of it{isNarrowed(filter) && ' that the filter leaves'}, not this page alone.
              </span>
            </p>
          </Row>
        )}
      </main>
      <Colophon>
        <span>What is written down is never changed. Days and times are in UTC.</span>
        <Link href="/help#groups">Who sees this page</Link>
      </Colophon>
    </>
  );
}

/** The parts of the address that were given once; one given twice is none. */
const onlyTexts = (
  given: Readonly<Record<string, string | string[] | undefined>>,
): Record<string, string | undefined> =>
  Object.fromEntries(Object.entries(given).map(([key, value]) => [key, typeof value === 'string' ? value : undefined]));
