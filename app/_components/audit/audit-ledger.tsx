import type { Route } from 'next';
import Link from 'next/link';
import type { AuditEntry } from '@/lib/audit/list';
import { Ledger } from '../ledger/ledger';
import { Moment } from '../moment/moment';
import { deedWords, detailWords } from './deed-words';

interface Props {
  entries: readonly AuditEntry[];
  /** The group whose trail it is. */
  name: string;
}

/** What was done in a group, a row a deed. */
export function AuditLedger({ entries, name }: Props) {
  return (
    <Ledger
      caption={`What was done in ${name}`}
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
            {deedWords(entry.action)} <Subject {...entry} />
          </td>
          <td className="quiet">{detailWords(entry.detail)}</td>
        </tr>
      ))}
    </Ledger>
  );
}

/** What it was done to; an identity is a link to its page. */
const Subject = ({ action, subject }: AuditEntry) =>
  action.startsWith('identity-') ? (
    <Link href={`/identities/${encodeURIComponent(subject)}` as Route}>{subject}</Link>
  ) : (
    <b>{subject}</b>
  );
