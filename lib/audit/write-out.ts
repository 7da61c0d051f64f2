import { csvLine } from '@/lib/export/csv';
import type { AuditEntry } from './list';

export const auditFormats = {
  csv: { type: 'text/csv; charset=utf-8', write: asCsv },
  json: { type: 'application/json', write: asJson },
} as const;

export const isAuditFormat = (text: string | null): text is keyof typeof auditFormats =>
  text !== null && Object.hasOwn(auditFormats, text);

type Portions = AsyncIterable<readonly AuditEntry[]>;

/** A line an event, with a head; what is particular to a deed as JSON in the last column. */
async function* asCsv(portions: Portions): AsyncGenerator<string> {
  yield csvLine(['at', 'who', 'action', 'subject', 'detail']);
  for await (const entries of portions)
    yield entries
      .map(({ at, actor, action, subject, detail }) =>
        csvLine([at.toISOString(), actor, action, subject, JSON.stringify(detail)]),
      )
      .join('');
}

/** One array of events. */
async function* asJson(portions: Portions): AsyncGenerator<string> {
  let before = '[';
  for await (const entries of portions) {
    yield entries
      .map(({ at, actor, action, subject, detail }) => {
        const line = before + JSON.stringify({ at, who: actor, action, subject, detail });
        before = ',\n';
        return line;
      })
      .join('');
  }
  yield before === '[' ? '[]\n' : ']\n';
}
