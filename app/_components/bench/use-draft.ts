'use client';

import { useCallback, useEffect, useRef, useState } from 'react';
import { type Draft, keepDraft, keptDraft, lastField } from './drafts';

const rest = 300;
const same = (a: Draft, b: Draft): boolean => a.statement === b.statement && a.field === b.field;

/**
 * Keeps what is written on this device. When the page opened something else than what was kept, the kept text is offered and not
 * overwritten until one of the two is chosen by writing on.
 *
 * @param opened - what the address opened, undefined for the bare bench, which goes on with the kept text, or over the last field
 * @param write - puts a draft into the line
 */
export function useDraft(opened: Draft | undefined, now: Draft, edited: boolean, write: (draft: Draft) => void) {
  const [offered, setOffered] = useState<Draft>();
  const start = useRef({ opened, write });
  const latest = useRef({ now, edited });

  useEffect(() => {
    latest.current = { now, edited };
  });

  useEffect(() => {
    const kept = keptDraft();
    const { opened: given, write: begin } = start.current;
    const field = lastField();
    if (!kept) {
      if (!given && field !== undefined) begin({ field, statement: '' });
    } else if (!given) begin(kept);
    else if (!same(kept, given)) setOffered(kept);
  }, []);

  useEffect(() => {
    if (!edited) return;
    const timer = setTimeout(() => keepDraft(now), rest);
    return () => clearTimeout(timer);
  }, [now, edited]);

  useEffect(() => {
    const keepAtOnce = () => {
      if (latest.current.edited) keepDraft(latest.current.now);
    };
    window.addEventListener('pagehide', keepAtOnce);
    return () => {
      window.removeEventListener('pagehide', keepAtOnce);
      keepAtOnce();
    };
  }, []);

  const goOn = useCallback(() => {
    if (offered) write(offered);
    setOffered(undefined);
  }, [offered, write]);
  const leave = useCallback(() => setOffered(undefined), []);

  return { offered, goOn, leave };
}
