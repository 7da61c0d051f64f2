import type { RevisionAnswer } from '@/lib/contracts/identity-answer';
import { listed } from '../../bench/phrase';

type Part = readonly [name: string, of: (revision: RevisionAnswer) => string];

const parts: readonly Part[] = [
  ['the kind', ({ kind }) => kind],
  ['the field', ({ field }) => field.text],
  ['the statement', ({ statement }) => statement.text],
  ['the hypotheses', ({ hypotheses }) => hypotheses.map(({ text }) => text).join('; ')],
  ['the place', ({ place }) => place?.text ?? ''],
  ['the uniformizer', ({ uniformizer }) => uniformizer?.text ?? ''],
  ['the value', ({ value }) => value?.text ?? ''],
  ['what it claims of the sides', ({ warning }) => String(warning)],
  ['the name', ({ name }) => name],
  ['the reference', ({ reference, doi, arxiv }) => [reference, doi, arxiv].join('|')],
  ['the tags', ({ tags }) => tags.join(' ')],
  ['the remark', ({ remark }) => remark ?? ''],
];

/** "Changes the statement and the tags." */
export function changedParts(before: RevisionAnswer, after: RevisionAnswer): string {
  const changed = parts.filter(([, of]) => of(before) !== of(after)).map(([name]) => name);
  return changed.length === 0 ? 'Changes nothing.' : `Changes ${listed(changed)}.`;
}
