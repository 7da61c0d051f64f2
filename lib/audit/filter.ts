import { type AuditAction, auditActions } from './actions';

/** Which events of a group are wanted; what is left out does not narrow. */
export interface AuditFilter {
  /** The name of a person, as it was then. */
  readonly person?: string;
  readonly action?: AuditAction;
  /** The first and the last day, as 2026-11-03, in UTC. */
  readonly from?: string;
  readonly to?: string;
  /** Words that all occur in what it was done to. */
  readonly words?: string;
}

export const isAuditAction = (text: string): text is AuditAction => Object.hasOwn(auditActions, text);

const longestText = 200;

/** The filter that an address asks for: what cannot be one does not narrow. */
export function auditFilterOf(query: Readonly<Record<string, string | undefined>>): AuditFilter {
  const text = (key: string): string | undefined => {
    const given = query[key]?.replaceAll('\0', '').trim().slice(0, longestText);
    return given === '' ? undefined : given;
  };
  const action = text('action');
  return {
    person: text('person'),
    action: action !== undefined && isAuditAction(action) ? action : undefined,
    from: dayOf(text('from')),
    to: dayOf(text('to')),
    words: text('words'),
  };
}

/** The filter as the query of an address, with whatever else the address says. */
export function auditQuery(filter: AuditFilter, more: Readonly<Record<string, string>> = {}): string {
  const given = Object.entries({ ...filter, ...more }).filter(
    (pair): pair is [string, string] => pair[1] !== undefined,
  );
  return new URLSearchParams(given).toString();
}

export const isNarrowed = (filter: AuditFilter): boolean => Object.values(filter).some((value) => value !== undefined);

/** A day of the calendar, or undefined: 2026-02-30 is none. */
function dayOf(text: string | undefined): string | undefined {
  if (text === undefined || !/^[1-9]\d{3}-\d{2}-\d{2}$/.test(text)) return undefined;
  const day = new Date(`${text}T00:00:00Z`);
  return !Number.isNaN(day.getTime()) && day.toISOString().startsWith(text) ? text : undefined;
}
