/** What was being written on this device. Kept in the browser only. */
export interface Draft {
  readonly field: string;
  readonly statement: string;
}

const draftKey = 'quadrel.bench.draft';
const fieldKey = 'quadrel.bench.field';

/** A browser may refuse storage; the bench then works without a memory. */
function attempt<T>(reach: (storage: Storage) => T): T | undefined {
  try {
    return reach(window.localStorage);
  } catch {
    return undefined;
  }
}

function isDraft(value: unknown): value is Draft {
  return (
    typeof value === 'object' &&
    value !== null &&
    'field' in value &&
    typeof value.field === 'string' &&
    'statement' in value &&
    typeof value.statement === 'string'
  );
}

export function keptDraft(): Draft | undefined {
  const found = attempt((storage) => storage.getItem(draftKey));
  if (!found) return undefined;
  const value = attempt((): unknown => JSON.parse(found));
  return isDraft(value) ? value : undefined;
}

/** Keeps a draft, or forgets it when there is nothing in it. */
export function keepDraft(draft: Draft): void {
  attempt((storage) =>
    draft.statement.trim() === '' ? storage.removeItem(draftKey) : storage.setItem(draftKey, JSON.stringify(draft)),
  );
}

export const lastField = (): string | undefined => attempt((storage) => storage.getItem(fieldKey)) ?? undefined;

export function rememberField(field: string): void {
  attempt((storage) => storage.setItem(fieldKey, field));
}
