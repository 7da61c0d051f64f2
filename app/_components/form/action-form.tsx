'use client';

import { unstable_rethrow } from 'next/navigation';
import {
  Fragment,
  startTransition,
  useActionState,
  useEffect,
  useMemo,
  useRef,
  type FormEvent,
  type ReactNode,
} from 'react';
import { Slip } from '../slip/slip';
import { FormContext } from './form-context';
import { unsent, type FormAction, type FormState } from './form-state';

interface Props {
  action: FormAction;
  /** Names the form where no heading does. */
  label?: string;
  className?: string;
  /** Once it is done the form begins anew, for the next one. */
  clears?: boolean;
  /** Told of every answer that has no error. */
  onDone?: (state: FormState) => void;
  children: ReactNode;
}

interface Answered {
  readonly state: FormState;
  /** How often it was done. */
  readonly round: number;
}

const writingPlaces = 'input:not([type=hidden], [hidden]), textarea, select';

/** What the form says when the server did not answer, or not as it should. */
const unanswered: FormState = {
  fault: 'The server did not answer. What you typed is still here; send it again in a moment.',
};

/**
 * A form that is sent to an action of the server. Nothing typed is lost on an error, only passwords are emptied; the first
 * field that has to change gets the focus, and what concerns the whole form is said above it.
 */
export function ActionForm({ action, label, className, clears = false, onDone, children }: Props) {
  const [{ state, round }, send, pending] = useActionState(
    async (before: Answered, form: FormData): Promise<Answered> => {
      const state = await action(before.state, form).catch((error: unknown) => {
        unstable_rethrow(error);
        return { ...unanswered };
      });
      return { state, round: before.round + (state.done === undefined ? 0 : 1) };
    },
    { state: unsent, round: 0 },
  );
  const form = useRef<HTMLFormElement>(null);
  const sent = useMemo(() => ({ state, pending }), [state, pending]);
  const told = useRef(onDone);
  useEffect(() => {
    told.current = onDone;
  });

  useEffect(() => {
    if (state === unsent) return;
    for (const field of form.current?.querySelectorAll<HTMLInputElement>('input[type=password]') ?? [])
      field.value = '';
    if (state.errors !== undefined)
      form.current?.querySelector<HTMLElement>('[aria-invalid=true], [aria-invalid=true] [tabindex="0"]')?.focus();
    else if (state.fault === undefined) {
      if (clears) form.current?.querySelector<HTMLElement>(writingPlaces)?.focus();
      told.current?.(state);
    }
  }, [state, clears]);

  // Sent by hand, because React empties a form that it sends itself.
  const onSubmit = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (pending) return;
    const given = new FormData(event.currentTarget, (event.nativeEvent as SubmitEvent).submitter);
    startTransition(() => send(given));
  };

  return (
    <FormContext value={sent}>
      <form ref={form} className={className} aria-label={label} aria-busy={pending} onSubmit={onSubmit} noValidate>
        {state.fault !== undefined && (
          <div className="form-slip">
            <Slip kind="ask">{state.fault}</Slip>
          </div>
        )}
        {state.done !== undefined && (
          <div className="form-slip">
            <Slip kind="good">{state.done}</Slip>
          </div>
        )}
        <Fragment key={clears ? round : 0}>{children}</Fragment>
      </form>
    </FormContext>
  );
}
