'use client';

import { useCallback, useEffect, useRef, useState } from 'react';
import { forgetDraft, saveDraft } from '@/app/register/draft-actions';
import type { IdentityDraft, IdentityForm } from '@/lib/contracts/identity-draft';
import { sameForm } from './form-values';

/** The hand must rest this long before what was typed is kept, in milliseconds. */
const rest = 600;

interface Props {
  /** Where the draft belongs. */
  readonly draftKey: string;
  /** What stands in the form, and the revision it goes back to. */
  readonly form: IdentityForm;
  readonly base: number | undefined;
  /** What the page opened with. */
  readonly start: IdentityForm;
  /** What was kept earlier. */
  readonly drafted: IdentityDraft | undefined;
}

/** Keeps on the server what is written in a form, and offers what was kept there before. */
export function useKeptDraft({ draftKey, form, base, start, drafted }: Props) {
  const [offered, setOffered] = useState(drafted && !sameForm(drafted.form, start) ? drafted : undefined);
  const [told, setTold] = useState('');
  const last = useRef(form);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  useEffect(() => {
    if (sameForm(form, last.current)) return;
    timer.current = setTimeout(() => {
      last.current = form;
      setOffered(undefined);
      saveDraft(draftKey, { form, ...(base === undefined ? {} : { base }) }).then(
        (kept) => setTold(kept ? 'Your text is kept as you write.' : 'This is too long to be kept as you write.'),
        () => setTold('Your text could not be kept just now. It is still here.'),
      );
    }, rest);
    return () => clearTimeout(timer.current);
  }, [draftKey, form, base]);

  /** The form is being sent: it is kept for good, or stays on the page. */
  const pause = useCallback(() => clearTimeout(timer.current), []);
  const leave = useCallback(() => {
    setOffered(undefined);
    forgetDraft(draftKey).catch(() => undefined);
  }, [draftKey]);
  const taken = useCallback(() => setOffered(undefined), []);

  return { offered, told, pause, leave, taken };
}
