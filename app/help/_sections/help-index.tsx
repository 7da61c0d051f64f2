import Link from 'next/link';
import { PageIndex } from '../../_components/shell/page-index';

const subjects = [
  { id: 'language', name: 'language' },
  { id: 'fields', name: 'fields' },
  { id: 'relations', name: 'relations and degrees' },
  { id: 'conventions', name: 'conventions' },
  { id: 'verdicts', name: 'verdicts' },
  { id: 'evidence', name: 'evidence' },
  { id: 'register', name: 'register' },
  { id: 'groups', name: 'groups and roles' },
  { id: 'keys', name: 'keys' },
  { id: 'rest', name: 'REST' },
  { id: 'tokens', name: 'tokens' },
  { id: 'errors', name: 'refusals' },
  { id: 'cautions', name: 'cautions' },
];

/** The index of the page; the subject being read is marked. */
export function HelpIndex() {
  return (
    <PageIndex subjects={subjects}>
      <Link href="/help/api">every call of the API</Link>
    </PageIndex>
  );
}
