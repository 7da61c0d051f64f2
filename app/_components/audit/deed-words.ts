import { auditActions } from '@/lib/audit/actions';
import { isAuditAction } from '@/lib/audit/filter';

/** What was done, as the page says it. A deed that an earlier version wrote down and this one has no words for keeps its name. */
export const deedWords = (action: string): string => (isAuditAction(action) ? auditActions[action] : action);

/** What else was written down, as text: "role author · days 30". */
export const detailWords = (detail: Readonly<Record<string, unknown>>): string =>
  Object.entries(detail)
    .filter(([, value]) => value !== null && value !== '')
    .map(([key, value]) => `${key} ${typeof value === 'object' ? JSON.stringify(value) : String(value)}`)
    .join(' · ');
