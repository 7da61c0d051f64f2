'use client';

import { Button } from '../button/button';
import { Leaf } from '../leaf/leaf';
import { useStored } from '../theme/stored';
import { letters } from './letters';
import type { KeyRow } from './registry';

const everywhere: readonly KeyRow[] = [
  { keys: ['O'], label: 'the list of rooms' },
  { keys: ['H'], label: 'all keys' },
];

/** All keys of the page, and the switch that turns single letters off. */
export function KeysLeaf({ open, onClose, rows }: { open: boolean; onClose: () => void; rows: readonly KeyRow[] }) {
  const on = useStored(letters) === 'on';
  return (
    <Leaf open={open} onClose={onClose} title="Keys" broad>
      <ul className="keymap">
        {[...rows, ...everywhere].map((row) => (
          <li key={row.label}>
            {row.keys.map((key) => (
              <kbd key={key}>{key}</kbd>
            ))}
            {row.label}
          </li>
        ))}
      </ul>
      <p className="ruled">
        <label className="tick">
          <input type="checkbox" checked={on} onChange={() => letters.write(on ? 'off' : 'on')} />
          Single letters act outside writing places
        </label>
      </p>
      <div className="btns">
        <Button onClick={onClose}>Close</Button>
      </div>
    </Leaf>
  );
}
