'use client';

import { useEffect, type ReactNode } from 'react';

interface Props {
  /** news: ink; good: glaze, something is done; ask: clay, it is your turn. */
  kind?: 'news' | 'good' | 'ask';
  action?: ReactNode;
  /** Given, the slip can be closed; mere news closes itself after eight seconds. */
  onClose?: () => void;
  children: ReactNode;
}

const newsStaysFor = 8000;

/** A message that stands in the flow above the matter it concerns. */
export function Slip({ kind = 'news', action, onClose, children }: Props) {
  useEffect(() => {
    if (kind !== 'news' || !onClose) return;
    const timer = setTimeout(onClose, newsStaysFor);
    return () => clearTimeout(timer);
  }, [kind, onClose]);
  return (
    <div className={`slip ${kind === 'news' ? '' : kind}`} role={kind === 'ask' ? 'alert' : 'status'}>
      <p>{children}</p>
      {action}
      {onClose && (
        <button type="button" className="plain" onClick={onClose}>
          Close
        </button>
      )}
    </div>
  );
}
