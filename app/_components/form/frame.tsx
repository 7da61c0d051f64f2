'use client';

import { useId, type ReactNode } from 'react';
import { useSent } from './form-context';

/** What ties a control to its label and to what is said below it. */
export interface Framed {
  readonly id: string;
  readonly 'aria-describedby': string | undefined;
  readonly 'aria-invalid': true | undefined;
}

interface Props {
  label: ReactNode;
  name: string;
  hint?: ReactNode;
  error?: string;
  id?: string;
  children: (frame: Framed) => ReactNode;
}

/** Label above a control; below it a hint, or the error that takes the place of the hint. */
export function Frame({ label, name, hint, error, id, children }: Props) {
  const made = useId();
  const control = id ?? made;
  const below = `${control}-below`;
  const { state } = useSent();
  const wrong = error ?? state.errors?.[name];
  const said = wrong ?? hint;
  return (
    <div className="form-field">
      <label className="label" htmlFor={control}>
        {label}
      </label>
      {children({
        id: control,
        'aria-describedby': said === undefined ? undefined : below,
        'aria-invalid': wrong === undefined ? undefined : true,
      })}
      {said !== undefined && (
        <p className={wrong === undefined ? 'hint' : 'hint wrong'} id={below}>
          {said}
        </p>
      )}
    </div>
  );
}
