import type { ReactNode } from 'react';

interface Props {
  /** Said to screen readers; the side-head says it to the eye. */
  caption: string;
  head: readonly ReactNode[];
  /** On a phone: rows become stacked entries, or the table scrolls sideways. */
  narrow?: 'stack' | 'scroll';
  className?: string;
  children: ReactNode;
}

/** A table: italic heads over a two-pixel rule, hairlines, no stripes, no boxes. `children` are its rows. */
export function Ledger({ caption, head, narrow = 'scroll', className = '', children }: Props) {
  const table = (
    <table className={`ledger ${narrow === 'stack' ? 'stack' : ''} ${className}`}>
      <caption className="sr">{caption}</caption>
      <thead>
        <tr>
          {head.map((name, index) => (
            <th scope="col" key={index}>
              {name}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>{children}</tbody>
    </table>
  );
  if (narrow === 'stack') return table;
  return (
    <div className="scroll" tabIndex={0} role="group" aria-label={caption}>
      {table}
    </div>
  );
}
