import type { ReactNode } from 'react';

interface Props {
  /** The italic side-head; without it the column stays empty. */
  side?: ReactNode;
  /** How far down it sits beside what follows. */
  sideClass?: '' | 'to-chain' | 'to-lead' | 'to-strip' | 'to-table' | 'to-contents';
  id?: string;
  className?: string;
  /** Names the section where there is no side-head. */
  label?: string;
  level?: 2 | 3;
  children: ReactNode;
}

/** A section on the one axis of the page: its side-head hangs to the left, its matter starts at the axis. */
export function Row({ side, sideClass = '', id, className = 'sec', label, level = 2, children }: Props) {
  const Heading = level === 2 ? 'h2' : 'h3';
  const headed = side !== undefined && id !== undefined;
  return (
    <section
      className={`row ${className}`}
      id={id}
      aria-label={label}
      aria-labelledby={headed ? `${id}-head` : undefined}
    >
      {side === undefined ? (
        <span />
      ) : (
        <Heading className={`side ${sideClass}`} id={headed ? `${id}-head` : undefined}>
          {side}
        </Heading>
      )}
      <div>{children}</div>
    </section>
  );
}
