'use client';

import Link from 'next/link';
import { useEffect, useState } from 'react';

const subjects = [
  { id: 'language', name: 'language' },
  { id: 'fields', name: 'fields' },
  { id: 'relations', name: 'relations and degrees' },
  { id: 'conventions', name: 'conventions' },
  { id: 'verdicts', name: 'verdicts' },
  { id: 'evidence', name: 'evidence' },
  { id: 'errors', name: 'refusals' },
  { id: 'keys', name: 'keys' },
  { id: 'rest', name: 'REST' },
  { id: 'cautions', name: 'cautions' },
];

/** The index of the page; the subject being read is marked. */
export function HelpIndex() {
  const [here, setHere] = useState('language');

  useEffect(() => {
    const mark = () => {
      const passed = subjects.filter(
        ({ id }) => (document.getElementById(id)?.getBoundingClientRect().top ?? Infinity) < 160,
      );
      setHere(passed.at(-1)?.id ?? 'language');
    };
    mark();
    document.addEventListener('scroll', mark, { passive: true });
    return () => document.removeEventListener('scroll', mark);
  }, []);

  return (
    <nav className="index" aria-label="On this page">
      {subjects.map(({ id, name }) => (
        <a key={id} href={`#${id}`} aria-current={here === id ? 'location' : undefined}>
          {name}
        </a>
      ))}
      <Link href="/help/api">every call of the API</Link>
    </nav>
  );
}
