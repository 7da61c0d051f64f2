import type { AuditEntry } from '@/lib/audit/list';
import { Ledger } from '../ledger/ledger';
import { Moment } from '../moment/moment';
import { deedWords, detailWords } from './deed-words';

/** What was done in a group, a row a deed. */
export function AuditLedger({ entries, group }: { entries: readonly AuditEntry[]; group: string }) {
  return (
    <Ledger
      caption={`What was done in ${group}`}
      head={['when', 'who', 'what', 'with what']}
      narrow="stack"
      className="audit"
    >
      {entries.map((entry) => (
        <tr key={entry.id}>
          <td className="num quiet">
            <Moment at={entry.at} time />
          </td>
          <td>{entry.actor}</td>
          <td>
            {deedWords(entry.action)} <b>{entry.subject}</b>
          </td>
          <td className="quiet">{detailWords(entry.detail)}</td>
        </tr>
      ))}
    </Ledger>
  );
}
