'use client';

import Form from 'next/form';
import { useRouter } from 'next/navigation';
import { type ReactNode, useEffect, useRef, useState, useTransition } from 'react';
import type { IdentityQuery } from '@/lib/contracts/identity-query';
import { useKey } from '../keys/keys-provider';
import { registerHref } from './address';
import { Filters, type Choices } from './filters';

/** How long the hand must rest before the register is looked through, in milliseconds. */
const rest = 250;

interface Props {
  readonly query: IdentityQuery;
  readonly choices: Choices;
  /** The states, filter and legend at once. */
  readonly states: ReactNode;
  readonly writeOut: ReactNode;
  /** What was found. */
  readonly children: ReactNode;
}

/**
 * The register: what is looked for on stone, what was found on paper. It is a plain form, whose answer is an address; with
 * scripts it is sent while one types, and the ledger stays in its place until the next one is there.
 */
export function RegisterRoom({ query, choices, states, writeOut, children }: Props) {
  const router = useRouter();
  const [looking, startLooking] = useTransition();
  const [words, setWords] = useState(query.words ?? '');
  const line = useRef<HTMLInputElement>(null);
  /** What this page itself asked for and may still get answers to. */
  const sent = useRef(new Set([query.words ?? '']));
  const asked = useRef(query.words ?? '');
  useKey({ keyName: 'M', label: 'look for an identity', act: () => line.current?.focus() });

  const go = (changes: Parameters<typeof registerHref>[1]) => {
    asked.current = words.trim();
    sent.current.add(asked.current);
    const href = registerHref(query, { words: asked.current, ...changes });
    startLooking(() => router.replace(href, { scroll: false }));
  };
  const latest = useRef(go);
  useEffect(() => {
    latest.current = go;
  });

  useEffect(() => {
    if (words.trim() === asked.current) return;
    const timer = setTimeout(() => latest.current({}), rest);
    return () => clearTimeout(timer);
  }, [words]);

  // A link of the page may bring other words than those one typed.
  useEffect(() => {
    const given = query.words ?? '';
    if (!sent.current.has(given)) setWords(given);
    if (!sent.current.has(given) || given === asked.current) {
      sent.current = new Set([given]);
      asked.current = given;
    }
  }, [query.words]);

  return (
    <>
      <section className="slab" aria-label="What is looked for">
        <Form action="/register" role="search" scroll={false} replace>
          {query.state !== undefined && <input type="hidden" name="state" value={query.state} />}
          {query.sort !== '-changed' && <input type="hidden" name="sort" value={query.sort} />}
          <div className="row">
            <span className="side look-side" aria-hidden="true">
              look for
            </span>
            <div>
              <label className="label" htmlFor="words">
                Words in a name, statement, hypothesis, reference or remark
              </label>
              <input
                ref={line}
                id="words"
                name="words"
                type="search"
                className="field look-line"
                value={words}
                maxLength={200}
                onChange={(event) => setWords(event.target.value)}
                onKeyDown={(event) => event.key === 'Escape' && words === '' && event.currentTarget.blur()}
                placeholder="for instance: Steinberg, or residue"
                autoComplete="off"
                spellCheck={false}
              />
            </div>
          </div>
          <div className="row">
            <span />
            <div className="sifting">
              {states}
              <div className="asks">
                <Filters query={query} choices={choices} onChoose={go} />
                {writeOut}
              </div>
            </div>
          </div>
        </Form>
      </section>
      <main className="sheet" id="sheet" tabIndex={-1} aria-busy={looking}>
        {children}
      </main>
    </>
  );
}
