'use client';

import { type ReactNode, useEffect, useState } from 'react';

interface Props {
  readonly subjects: readonly { readonly id: string; readonly name: string }[];
  /** Further links behind those into the page. */
  readonly children?: ReactNode;
}

/** The index of a page, in place of tabs; the subject being read is marked. */
export function PageIndex({ subjects, children }: Props) {
  const first = subjects[0]?.id;
  const [here, setHere] = useState(first);

  useEffect(() => {
    const mark = () => {
      const passed = subjects.filter(
        ({ id }) => (document.getElementById(id)?.getBoundingClientRect().top ?? Infinity) < 160,
      );
      setHere(passed.at(-1)?.id ?? first);
    };
    mark();
    document.addEventListener('scroll', mark, { passive: true });
    return () => document.removeEventListener('scroll', mark);
  }, [subjects, first]);

  return (
    <nav className="index" aria-label="On this page">
      {subjects.map(({ id, name }) => (
        <a key={id} href={`#${id}`} aria-current={here === id ? 'location' : undefined}>
          {name}
        </a>
      ))}
      {children}
    </nav>
  );
}
