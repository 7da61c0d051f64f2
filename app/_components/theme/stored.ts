'use client';

import { useSyncExternalStore } from 'react';

/** A choice of one person, kept in this browser. All that show it change together, in other tabs too. */
export interface Stored<V extends string> {
  read(): V;
  write(value: V): void;
  subscribe(listener: () => void): () => void;
  readonly fallback: V;
}

export function stored<V extends string>(key: string, allowed: readonly V[], fallback: V): Stored<V> {
  const listeners = new Set<() => void>();
  let unsaved: V | undefined;
  return {
    fallback,
    read() {
      try {
        const found = window.localStorage.getItem(key);
        return allowed.find((value) => value === found) ?? unsaved ?? fallback;
      } catch {
        return unsaved ?? fallback;
      }
    },
    write(value) {
      unsaved = value;
      try {
        if (value === fallback) window.localStorage.removeItem(key);
        else window.localStorage.setItem(key, value);
      } catch {
        // A browser that keeps nothing still obeys until the page is left.
      }
      listeners.forEach((listener) => listener());
    },
    subscribe(listener) {
      const fromOtherTab = (event: StorageEvent) => event.key === key && listener();
      listeners.add(listener);
      window.addEventListener('storage', fromOtherTab);
      return () => {
        listeners.delete(listener);
        window.removeEventListener('storage', fromOtherTab);
      };
    },
  };
}

export function useStored<V extends string>(store: Stored<V>): V {
  return useSyncExternalStore(store.subscribe, store.read, () => store.fallback);
}
