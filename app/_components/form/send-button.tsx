'use client';

import type { ReactNode } from 'react';
import { Button } from '../button/button';
import { useSent } from './form-context';

interface Props {
  /** Clay at most once on a page. */
  kind?: 'primary' | 'outlined' | 'plain';
  name?: string;
  value?: string;
  /** What it is called where the words on it are not enough by themselves. */
  label?: string;
  children: ReactNode;
}

/** Sends the form around it. */
export function SendButton({ kind = 'primary', name, value, label, children }: Props) {
  const { pending } = useSent();
  return (
    <Button type="submit" kind={kind} name={name} value={value} aria-label={label} aria-busy={pending}>
      {children}
    </Button>
  );
}
