'use client';

import { createContext, useContext, useEffect, useRef, useState, type ReactNode } from 'react';
import { useStored } from '../theme/stored';
import { RoomsLeaf } from '../shell/rooms-leaf';
import type { Who } from '../shell/who';
import { KeysLeaf } from './keys-leaf';
import { letters } from './letters';
import { isWritingPlace, KeyRegistry } from './registry';

type OpenLeaf = 'keys' | 'rooms' | undefined;

interface Keys {
  readonly registry: KeyRegistry;
  readonly openLeaf: (leaf: OpenLeaf) => void;
}

const KeysContext = createContext<Keys | undefined>(undefined);

function useKeys(): Keys {
  const keys = useContext(KeysContext);
  if (!keys) throw new Error('Keys are registered inside KeysProvider.');
  return keys;
}

/** Opens the list of keys or the list of rooms. */
export const useOpenLeaf = () => useKeys().openLeaf;

/** Registers a single letter while the component is mounted and `enabled`. It acts outside writing places and leaves only. */
export function useKey({
  keyName,
  label,
  act,
  enabled = true,
}: {
  keyName: string;
  label: string;
  act: () => void;
  enabled?: boolean;
}) {
  const { registry } = useKeys();
  const latest = useRef(act);
  useEffect(() => {
    latest.current = act;
  });
  useEffect(() => {
    if (!enabled) return;
    return registry.add({ keyName, label, act: () => latest.current() });
  }, [registry, keyName, label, enabled]);
}

/** A row in the list of keys for keys that are handled where they are pressed, such as Ctrl+Enter in the line. */
export function useKeyNote({ keys, label }: { keys: readonly string[]; label: string }) {
  const { registry } = useKeys();
  const written = keys.join(' ');
  useEffect(() => registry.addNote({ keys: written.split(' '), label }), [registry, written, label]);
}

/** Keys for all that is inside; `who` is told to the list of rooms. */
export function KeysProvider({ who, children }: { who: Who; children: ReactNode }) {
  const [registry] = useState(() => new KeyRegistry());
  const [leaf, setLeaf] = useState<OpenLeaf>();
  const on = useStored(letters) === 'on';

  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      if (!on || event.defaultPrevented || event.ctrlKey || event.altKey || event.metaKey || event.isComposing) return;
      if (event.key.length !== 1 || isWritingPlace(event.target) || document.querySelector('dialog[open]')) return;
      const letter = event.key.toUpperCase();
      const key = registry.find(letter);
      if (!key && letter !== 'H' && letter !== 'O') return;
      event.preventDefault();
      if (key) key.act();
      else setLeaf(letter === 'H' ? 'keys' : 'rooms');
    };
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, [registry, on]);

  const close = () => setLeaf(undefined);
  return (
    <KeysContext.Provider value={{ registry, openLeaf: setLeaf }}>
      {children}
      <KeysLeaf open={leaf === 'keys'} onClose={close} rows={leaf === 'keys' ? registry.rows() : []} />
      <RoomsLeaf open={leaf === 'rooms'} onClose={close} who={who} />
    </KeysContext.Provider>
  );
}
