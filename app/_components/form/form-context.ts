'use client';

import { createContext, useContext } from 'react';
import { unsent, type FormState } from './form-state';

interface Sent {
  readonly state: FormState;
  readonly pending: boolean;
}

export const FormContext = createContext<Sent>({ state: unsent, pending: false });

/** What became of the form around; outside of one, nothing was sent. */
export const useSent = (): Sent => useContext(FormContext);
