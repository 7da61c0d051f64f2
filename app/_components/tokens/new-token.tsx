'use client';

import './tokens.css';

import { useState } from 'react';
import { makeTokenAction, type TokenFormState } from '../../account/tokens/actions';
import { ActionForm } from '../form/action-form';
import { Field } from '../form/field';
import { SendButton } from '../form/send-button';
import { type OfferedScope, ScopeChoice } from './scope-choice';
import { type MadeToken, ShownOnce } from './shown-once';

interface Props {
  /** Short name of the group it is made for. */
  group: string;
  scopes: readonly OfferedScope[];
  longestName: number;
  longestLife: number;
}

/** The form that makes a token. What it answers is shown above it, once. */
export function NewToken({ group, scopes, longestName, longestLife }: Props) {
  const [made, setMade] = useState<MadeToken>();
  // An empty form for the next one, once the last is made.
  const [round, setRound] = useState(0);
  const onDone = (state: TokenFormState) => {
    setMade(state.made);
    setRound(round + 1);
  };
  return (
    <>
      {made !== undefined && <ShownOnce key={made.id} token={made} onClose={() => setMade(undefined)} />}
      <ActionForm key={round} action={makeTokenAction} label="Make a token" className="door" onDone={onDone}>
        <input type="hidden" name="group" value={group} />
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
