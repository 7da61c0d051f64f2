'use client';

import { useOpenLeaf } from '../keys/keys-provider';

/** "Every action has a key": says so, and opens the list. */
export function KeysLink() {
  const openLeaf = useOpenLeaf();
  return (
    <span>
      Every action has a key: press <kbd>H</kbd>, or see{' '}
      <button type="button" className="underline" aria-haspopup="dialog" onClick={() => openLeaf('keys')}>
        all keys
      </button>
    </span>
  );
}
