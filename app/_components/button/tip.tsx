'use client';

import { useEffect, useId, useRef, useState, type ReactNode } from 'react';

interface Props {
  text: string;
  keyName?: string;
  side?: 'left' | 'right';
  wide?: boolean;
  /** Gets the id that the control describes itself by while the tip shows. */
  children: (describedBy: string | undefined) => ReactNode;
}

/** A tooltip: ink, name, key. It shows on hover and on keyboard focus, can be hovered itself, and Esc puts it away. */
export function Tip({ text, keyName, side = 'left', wide = false, children }: Props) {
  const [shown, setShown] = useState(false);
  const holder = useRef<HTMLSpanElement>(null);
  const id = useId();

  useEffect(() => {
    if (!shown) return;
    const putAway = (event: KeyboardEvent) => {
      if (event.key === 'Escape') setShown(false);
    };
    document.addEventListener('keydown', putAway, true);
    return () => document.removeEventListener('keydown', putAway, true);
  }, [shown]);

  return (
    <span
      ref={holder}
      className={`tip-holder ${wide ? 'wide' : ''}`}
      onPointerEnter={(event) => event.pointerType === 'mouse' && setShown(true)}
      onPointerLeave={() => setShown(false)}
      onPointerDown={() => setShown(false)}
      onFocus={(event) => event.target.matches(':focus-visible') && setShown(true)}
      onBlur={() => setShown(false)}
    >
      {children(shown ? id : undefined)}
      {shown && (
        <span role="tooltip" id={id} className={`tip ${side === 'right' ? 'from-right' : ''}`}>
          {text}
          {keyName !== undefined && <kbd>{keyName}</kbd>}
        </span>
      )}
    </span>
  );
}
