import { auditActions } from '@/lib/audit/actions';
import { isAuditAction } from '@/lib/audit/filter';

/** What was done, as the page says it. A deed that an earlier version wrote down and this one has no words for keeps its name. */
export const deedWords = (action: string): string => (isAuditAction(action) ? auditActions[action] : action);

/** How what else was written down is said, in the order in which it is said. */
const sayings: Readonly<Record<string, (value: string) => string>> = {
  of: (owner) => `of ${owner}`,
  from: (before) => `from ${before}`,
  to: (after) => `to ${after}`,
  role: (role) => `as ${role}`,
  email: (address) => address,
  scopes: (scopes) => `may ${scopes}`,
  days: (days) => `for ${days} ${days === '1' ? 'day' : 'days'}`,
  ending: (ending) => `ending in ${ending}`,
  revision: (number) => `revision ${number}`,
  name: (name) => name,
  visibility: (who) => `seen by ${who === 'public' ? 'anyone' : 'the group'}`,
  verdict: (verdict) => `verdict ${verdict}`,
  change: (change) => change,
  reason: (reason) => reason,
};

/** What else was written down of a deed, in words. */
export function detailWords(detail: Readonly<Record<string, unknown>>): string {
  const known = Object.keys(sayings);
  const keys = [...known.filter((key) => key in detail), ...Object.keys(detail).filter((key) => !known.includes(key))];
  return keys
    .filter((key) => detail[key] !== null && detail[key] !== '')
    .map((key) => {
      const value = detail[key];
      const text = typeof value === 'object' ? JSON.stringify(value) : String(value);
      return sayings[key]?.(text) ?? `${key} ${text}`;
    })
    .join(' · ');
}
