'use client';

import { useState } from 'react';
import { makeTokenAction, type TokenFormState } from '../../account/tokens/actions';
import { ActionForm } from '../form/action-form';
import { Field } from '../form/field';
import { SendButton } from '../form/send-button';
import { type OfferedScope, ScopeChoice } from './scope-choice';
import { type MadeToken, ShownOnce } from './shown-once';

interface Props {
  scopes: readonly OfferedScope[];
  longestName: number;
  longestLife: number;
}

/** The form that makes a token. What it answers is shown above it, once. */
export function NewToken({ scopes, longestName, longestLife }: Props) {
  const [made, setMade] = useState<MadeToken>();
  return (
    <>
      {made !== undefined && <ShownOnce key={made.id} token={made} onClose={() => setMade(undefined)} />}
      <ActionForm
        action={makeTokenAction}
        label="Make a token"
        className="door"
        clears
        onDone={(state: TokenFormState) => setMade(state.made)}
      >
        <div className="two">
          <Field label="Name" name="name" required hint={`What will use it, in at most ${longestName} characters`} />
          <Field
            label="Days it holds"
            name="days"
            type="number"
            min={1}
            max={longestLife}
            defaultValue={90}
            required
            hint={`A year at most: ${longestLife}`}
          />
        </div>
        <ScopeChoice offered={scopes} />
        <div className="form-acts">
          <SendButton>Make the token</SendButton>
        </div>
      </ActionForm>
    </>
  );
}
