'use client';

import { useEffect, useId, useRef, type ReactNode } from 'react';

interface Props {
  open: boolean;
  onClose: () => void;
  title: ReactNode;
  broad?: boolean;
  children: ReactNode;
}

/** A leaf laid over the darkened table. Focus goes to its first writing place (else the first control); Esc leaves it. */
export function Leaf({ open, onClose, title, broad = false, children }: Props) {
  const leaf = useRef<HTMLDialogElement>(null);
  const heading = useId();

  useEffect(() => {
    const dialog = leaf.current;
    if (!dialog || !open) return;
    const before = document.activeElement;
    if (!dialog.open) dialog.showModal();
    dialog.querySelector<HTMLElement>('input:not([type=checkbox]), textarea, select, [contenteditable=true]')?.focus();
    return () => {
      dialog.close();
      // The leaf is taken away before it could hand the focus back by itself.
      if (document.activeElement === document.body && before instanceof HTMLElement) before.focus();
    };
  }, [open]);

  if (!open) return null;
  return (
    <dialog
      ref={leaf}
      className={`leaf ${broad ? 'broad' : ''}`}
      aria-labelledby={heading}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onPointerDown={(event) => event.target === leaf.current && outside(event, leaf.current) && onClose()}
    >
      <h2 id={heading}>{title}</h2>
      {children}
    </dialog>
  );
}

/** A press on the darkened table reaches the dialog itself, outside its box. */
function outside(event: { clientX: number; clientY: number }, dialog: HTMLElement): boolean {
  const box = dialog.getBoundingClientRect();
  return event.clientX < box.left || event.clientX > box.right || event.clientY < box.top || event.clientY > box.bottom;
}
