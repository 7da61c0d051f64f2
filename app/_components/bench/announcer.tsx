'use client';

import { useEffect, useState } from 'react';
import type { Asked } from './use-answer';
import { announcement } from './verdict-words';

/** An answer must stand this long before it is said aloud, in milliseconds. */
const steady = 700;

/** Says a verdict to screen readers once it is steady, and nothing while it still changes. */
export function Announcer({ asked }: { readonly asked: Asked }) {
  const [said, setSaid] = useState('');
  const { answer, current } = asked;
  useEffect(() => {
    if (!answer || !current) return;
    const timer = setTimeout(() => setSaid(announcement(answer)), steady);
    return () => clearTimeout(timer);
  }, [answer, current]);
  return (
    <p className="sr" aria-live="polite">
      {said}
    </p>
  );
}
