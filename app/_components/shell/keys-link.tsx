'use client';

import { useOpenLeaf } from '../keys/keys-provider';

/** "Every action has a key": says so, and opens the list. */
export function KeysLink() {
  const openLeaf = useOpenLeaf();
  return (
    <span>
      Every action has a key: press{' '}
      <button
        type="button"
        className="key-button"
        aria-haspopup="dialog"
        aria-label="All keys (H)"
        onClick={() => openLeaf('keys')}
      >
        <kbd>H</kbd>
      </button>
    </span>
  );
}
