'use client';

import type { ComponentProps, ReactNode } from 'react';
import { Frame } from './frame';

interface Shared {
  /** Always visible, above the writing place. */
  label: ReactNode;
  name: string;
  /** What to write; an error takes its place. */
  hint?: ReactNode;
  /** What to change. Inside an ActionForm the answer of the action is shown by itself. */
  error?: string;
  /** For raw input: statements, fields, addresses. */
  mono?: boolean;
}

type Line = Shared & { multiline?: false } & Omit<ComponentProps<'input'>, keyof Shared>;
type Lines = Shared & { multiline: true } & Omit<ComponentProps<'textarea'>, keyof Shared>;

/** A writing place with its label, its hint and its error. It takes its look from where it stands: on stone or on paper. */
export function Field({ label, name, hint, error, mono = false, id, className = '', ...rest }: Line | Lines) {
  const look = `field ${mono ? 'mono' : ''} ${className}`;
  return (
    <Frame label={label} name={name} hint={hint} error={error} id={id}>
      {(frame) => {
        if (rest.multiline === true) {
          const { multiline: _, ...given } = rest;
          return <textarea rows={3} {...given} {...frame} name={name} className={look} />;
        }
        const { multiline: _, ...given } = rest;
        return <input type="text" {...given} {...frame} name={name} className={look} />;
      }}
    </Frame>
  );
}
