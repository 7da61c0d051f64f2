'use client';

import type { ComponentProps, ReactNode } from 'react';
import { Frame } from './frame';

interface Props extends Omit<ComponentProps<'select'>, 'children'> {
  label: ReactNode;
  name: string;
  options: readonly { readonly value: string; readonly label: string }[];
  hint?: ReactNode;
  error?: string;
}

/** A choice from a list, with its label, its hint and its error. */
export function Choose({ label, name, options, hint, error, id, className = '', ...rest }: Props) {
  return (
    <Frame label={label} name={name} hint={hint} error={error} id={id}>
      {(frame) => (
        <span className="choose">
          <select {...rest} {...frame} name={name} className={`field ${className}`}>
            {options.map((option) => (
              <option key={option.value} value={option.value}>
                {option.label}
              </option>
            ))}
          </select>
        </span>
      )}
    </Frame>
  );
}
