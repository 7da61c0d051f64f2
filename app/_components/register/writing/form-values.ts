import type { IdentityForm } from '@/lib/contracts/identity-draft';
import type { IdentityAnswer, RevisionAnswer } from '@/lib/contracts/identity-answer';

/** A form in which nothing is written yet. */
export const emptyForm: IdentityForm = {
  kind: 'equality',
  field: 'Q',
  statement: '',
  place: '',
  uniformizer: '',
  value: '',
  warning: false,
  name: '',
  reference: '',
  doi: '',
  arxiv: '',
  tags: '',
  remark: '',
  visibility: 'group',
  change: '',
};

type Written = Omit<RevisionAnswer, 'number' | 'author' | 'at' | 'change' | 'lastCheck'>;

/** A revision as it is written in the form: the hypotheses behind the statement, the tags in one line. */
export function formOf(written: Written, visibility: IdentityAnswer['visibility']): IdentityForm {
  const { statement, hypotheses } = written;
  return {
    kind: written.kind,
    field: written.field.text,
    statement: [statement.text, ...hypotheses.map(({ text }) => text)].join('; '),
    place: written.place?.text ?? '',
    uniformizer: written.uniformizer?.text ?? '',
    value: written.value?.text ?? '',
    warning: written.warning,
    name: written.name,
    reference: written.reference ?? '',
    doi: written.doi ?? '',
    arxiv: written.arxiv ?? '',
    tags: written.tags.join(', '),
    remark: written.remark ?? '',
    visibility,
    change: '',
  };
}

const keys = Object.keys(emptyForm) as (keyof IdentityForm)[];

export const sameForm = (a: IdentityForm, b: IdentityForm): boolean => keys.every((key) => a[key] === b[key]);
