'use client';

import { useId } from 'react';
import { useSent } from '../form/form-context';

export interface OfferedScope {
  readonly scope: string;
  readonly says: string;
  readonly chosen: boolean;
}

/** What the token may do, one tick each. */
export function ScopeChoice({ offered }: { offered: readonly OfferedScope[] }) {
  const { state } = useSent();
  const below = useId();
  const wrong = state.errors?.scopes;
  return (
    <fieldset className="form-field scope-choice" aria-describedby={wrong === undefined ? undefined : below}>
      <legend className="label">The script may</legend>
      {offered.map(({ scope, says, chosen }) => (
        <label key={scope} className="tick">
          <input
            type="checkbox"
            name="scopes"
            value={scope}
            defaultChecked={chosen}
            aria-invalid={wrong === undefined ? undefined : true}
          />
          <span>
            <b>{scope}</b> <span className="quiet">{says}</span>
          </span>
        </label>
      ))}
      {wrong !== undefined && (
        <p className="hint wrong" id={below}>
          {wrong}
        </p>
      )}
    </fieldset>
  );
}
