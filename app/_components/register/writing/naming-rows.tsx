import type { IdentityForm } from '@/lib/contracts/identity-draft';
import { Choose } from '../../form/choose';
import { Field } from '../../form/field';
import { Row } from '../../shell/row';

interface Props {
  readonly form: IdentityForm;
  readonly onWrite: (changes: Partial<IdentityForm>) => void;
  /** Of a new revision: who sees the identity is not part of it. */
  readonly revising: boolean;
}

type TextKey = 'name' | 'reference' | 'doi' | 'arxiv' | 'tags' | 'remark' | 'change';

/** Everything about an identity that is not mathematics. */
export function NamingRows({ form, onWrite, revising }: Props) {
  const text = (key: TextKey) => ({
    name: key,
    value: form[key],
    onChange: (event: { currentTarget: { value: string } }) => onWrite({ [key]: event.currentTarget.value }),
  });
  return (
    <>
      {revising && (
        <Row side="what changed" id="what-changed" sideClass="to-contents">
          <Field
            {...text('change')}
            label="What is changed, and why, in a line"
            hint="It stands beside the revision, for whoever compares the two."
            maxLength={400}
          />
        </Row>
      )}
      <Row side="name" id="naming" sideClass="to-contents">
        <div className="two">
          <Field {...text('name')} label="Name" hint="What the group calls it." required autoComplete="off" />
          <Field
            {...text('tags')}
            label="Tags, with commas between them"
            hint="Letters, digits and hyphens: steinberg, degree-2."
            autoComplete="off"
            autoCapitalize="off"
          />
        </div>
      </Row>
      <Row side="reference" id="referring" sideClass="to-contents">
        <Field {...text('reference')} label="Where it comes from" hint="In words: seminar note 4, lemma 2." />
        <div className="two">
          <Field {...text('doi')} label="DOI" hint="Such as 10.1000/lemma-2, or its address." autoCapitalize="off" />
          <Field {...text('arxiv')} label="arXiv" hint="Such as 2301.01234v2 or math/0301234." autoCapitalize="off" />
        </div>
      </Row>
      <Row side="remark" id="remarking" sideClass="to-contents">
        <Field {...text('remark')} multiline rows={4} label="What else to know about it" />
      </Row>
      {!revising && (
        <Row side="shown to" id="showing" sideClass="to-contents">
          <div className="two">
            <Choose
              label="Who can see it"
              name="visibility"
              value={form.visibility}
              options={[
                { value: 'group', label: 'the group' },
                { value: 'public', label: 'anyone with the link' },
              ]}
              onChange={(event) => onWrite({ visibility: event.currentTarget.value === 'public' ? 'public' : 'group' })}
            />
          </div>
        </Row>
      )}
    </>
  );
}
