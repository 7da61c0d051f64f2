'use client';

import { useRef, type KeyboardEvent } from 'react';

interface Props<V extends string> {
  label: string;
  options: readonly { value: V; label: string }[];
  value: V;
  onChange: (value: V) => void;
  small?: boolean;
}

/** A choice between a few: a course of joined stones, the chosen one laid in ink. */
export function Course<V extends string>({ label, options, value, onChange, small = false }: Props<V>) {
  const group = useRef<HTMLSpanElement>(null);
  const onKeyDown = (event: KeyboardEvent, index: number) => {
    const step = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const next = (index + step + options.length) % options.length;
    const option = options[next];
    if (option === undefined) return;
    onChange(option.value);
    group.current?.querySelectorAll<HTMLElement>('[role=radio]')[next]?.focus();
  };
  return (
    <span className={`course ${small ? 'small' : ''}`} role="radiogroup" aria-label={label} ref={group}>
      {options.map((option, index) => (
        <button
          key={option.value}
          type="button"
          role="radio"
          aria-checked={option.value === value}
          tabIndex={option.value === value ? 0 : -1}
          onClick={() => onChange(option.value)}
          onKeyDown={(event) => onKeyDown(event, index)}
        >
          {option.label}
        </button>
      ))}
    </span>
  );
}
