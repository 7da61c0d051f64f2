import { Row } from '../../_components/shell/row';

const keys: readonly { keys: readonly string[]; says: string }[] = [
  { keys: ['Ctrl', 'Enter'], says: 'in the line: decide now' },
  { keys: ['Alt', '['], says: 'in the line: brackets round what is chosen' },
  { keys: ['Alt', '<'], says: 'in the line: angle brackets round what is chosen' },
  { keys: ['Esc'], says: 'leave the line, so that letters act' },
  { keys: ['I'], says: 'back to the line' },
  { keys: ['F'], says: 'choose the field' },
  { keys: ['K'], says: 'keep as identity' },
  { keys: ['M'], says: 'look for an identity' },
  { keys: ['C'], says: 'copy as text' },
  { keys: ['T'], says: 'copy as TeX' },
  { keys: ['L'], says: 'copy the link' },
  { keys: ['W'], says: 'why: open or close the derivation' },
  { keys: ['R'], says: 'residues of this class' },
  { keys: ['S'], says: 'stop long work' },
  { keys: ['←', '→'], says: 'walk a strip of tiles' },
  { keys: ['O'], says: 'the list of rooms' },
  { keys: ['H'], says: 'all keys of the page' },
];

export function Keys() {
  return (
    <Row side="keys" id="keys" className="sec ruled">
      <ul className="keymap">
        {keys.map((row) => (
          <li key={row.says}>
            {row.keys.map((key) => (
              <kbd key={key}>{key}</kbd>
            ))}
            {row.says}
          </li>
        ))}
      </ul>
      <p className="text mt-4 max-w-[44em]">
        Letters act outside writing places only. They can be turned off in the list that <kbd>H</kbd> opens; the foot of
        every page has a button for it too.
      </p>
    </Row>
  );
}
