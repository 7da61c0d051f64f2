import type { IdentityForm } from '@/lib/contracts/identity-draft';
import type { IdentityOutcome } from '@/lib/contracts/identity-outcome';
import { Button } from '../../button/button';
import { Field } from '../../form/field';
import type { ResidueFound } from './use-residue';

interface Props {
  readonly form: IdentityForm;
  readonly errors: IdentityOutcome['errors'];
  readonly found: ResidueFound;
  readonly onWrite: (changes: Partial<IdentityForm>) => void;
}

/** Where the residue is taken, against which uniformizer, and what it is claimed to be. */
export function ResidueFields({ form, errors, found, onWrite }: Props) {
  const typed = { autoComplete: 'off', autoCapitalize: 'off', spellCheck: false, mono: true } as const;
  const value = found.residue?.value.text;
  return (
    <div className="row">
      <span />
      <div className="residue-fields">
        <Field
          {...typed}
          label="Place"
          name="place"
          value={form.place}
          error={errors?.place}
          hint="A prime, such as 7."
          onChange={(event) => onWrite({ place: event.currentTarget.value })}
        />
        <Field
          {...typed}
          label="Uniformizer, if another"
          name="uniformizer"
          value={form.uniformizer}
          error={errors?.uniformizer}
          hint="Blank: the place itself."
          onChange={(event) => onWrite({ uniformizer: event.currentTarget.value })}
        />
        <Field
          {...typed}
          label="Value"
          name="value"
          value={form.value}
          error={errors?.value}
          hint={
            value !== undefined && form.value.trim() === '' ? (
              <Button kind="plain" className="as-hint" onClick={() => onWrite({ value })}>
                Take the residue that was found
              </Button>
            ) : (
              'What the residue is, over the residue field.'
            )
          }
          onChange={(event) => onWrite({ value: event.currentTarget.value })}
        />
      </div>
    </div>
  );
}
