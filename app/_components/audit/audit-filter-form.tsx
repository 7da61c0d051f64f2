import './audit.css';
import Link from 'next/link';
import { auditActions } from '@/lib/audit/actions';
import { type AuditFilter, isNarrowed } from '@/lib/audit/filter';
import { Choose } from '../form/choose';
import { Field } from '../form/field';

interface Props {
  filter: AuditFilter;
  people: readonly string[];
}

/** Narrows the trail down. It is sent by GET, so that what it shows has an address and needs no script. */
export function AuditFilterForm({ filter, people }: Props) {
  // Somebody who was chosen stays in the list even where nothing is left of what was done.
  const names = filter.person === undefined || people.includes(filter.person) ? people : [filter.person, ...people];
  return (
    <form method="get" action="/group/audit" className="audit-filter" role="search" aria-label="Narrow down">
      <Choose
        label="Person"
        name="person"
        defaultValue={filter.person ?? ''}
        options={[{ value: '', label: 'everyone' }, ...names.map((name) => ({ value: name, label: name }))]}
      />
      <Choose
        label="Deed"
        name="action"
        defaultValue={filter.action ?? ''}
        options={[
          { value: '', label: 'everything' },
          ...Object.entries(auditActions).map(([value, label]) => ({ value, label })),
        ]}
      />
      <Field label="From" name="from" type="date" defaultValue={filter.from} />
      <Field label="To, that day included" name="to" type="date" defaultValue={filter.to} />
      <Field
        label="Words in the subject"
        name="words"
        defaultValue={filter.words}
        placeholder="for instance: skerry-6"
      />
      <div className="form-acts">
        <button type="submit" className="btn">
          Look
        </button>
        {isNarrowed(filter) && <Link href="/group/audit">Everything</Link>}
      </div>
    </form>
  );
}
