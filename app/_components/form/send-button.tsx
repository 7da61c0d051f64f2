'use client';

import type { ReactNode } from 'react';
import { Button } from '../button/button';
import { useSent } from './form-context';

interface Props {
  /** Clay at most once on a page. */
  kind?: 'primary' | 'outlined' | 'plain';
  name?: string;
  value?: string;
  children: ReactNode;
}

/** Sends the form around it. */
export function SendButton({ kind = 'primary', name, value, children }: Props) {
  const { pending } = useSent();
  return (
    <Button type="submit" kind={kind} name={name} value={value} aria-busy={pending}>
      {children}
    </Button>
  );
}
