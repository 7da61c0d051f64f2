import type { ReactNode } from 'react';

export type Mark = 'equal' | 'different' | 'undecided' | 'unread' | 'old';

/** Shape carries the meaning, colour repeats it: two bars on a whole tile, a tile cut in two, a tile not fired yet. */
const drawings: Record<Mark, ReactNode> = {
  equal: (
    <>
      <path fill="var(--glaze)" d="M0 0h48v48H0z" />
      <path fill="var(--on-glaze)" d="M12 17h24v5H12zM12 26h24v5H12z" />
    </>
  ),
  // The bars change ink along the cut x + y = 48: their corners on it are written out, so that no clip path needs a name.
  different: (
    <>
      <path fill="var(--paper)" d="M0 0h48v48H0z" />
      <path fill="var(--ink)" d="M0 0h48L0 48z" />
      <path fill="var(--paper)" d="M12 17h19l-5 5H12zM12 26h10l-5 5h-5z" />
      <path fill="var(--ink)" d="M31 17h5v5H26zM22 26h14v5H17z" />
      <path fill="none" stroke="var(--ink)" strokeWidth="2.4" d="M1.2 1.2h45.6v45.6H1.2z" />
    </>
  ),
  undecided: (
    <>
      <path fill="none" stroke="var(--ink-2)" strokeWidth="3" strokeDasharray="6 4" d="M1.5 1.5h45v45h-45z" />
      <path
        fill="var(--ink-2)"
        d="M12 17h5v5h-5zM21.5 17h5v5h-5zM31 17h5v5h-5zM12 26h5v5h-5zM21.5 26h5v5h-5zM31 26h5v5h-5z"
      />
    </>
  ),
  unread: (
    <>
      <path fill="none" stroke="var(--ink-2)" strokeWidth="3" d="M1.5 1.5h45v45h-45z" />
      <path fill="var(--ink-2)" d="M10 38h28v4H10z" />
    </>
  ),
  old: (
    <>
      <path
        fill="none"
        stroke="var(--glaze)"
        strokeWidth="2"
        d="M7 0 0 7M14 0 0 14M21 0 0 21M28 0 0 28M35 0 0 35M42 0 0 42M49 0 0 49M48 8 8 48M48 15 15 48M48 22 22 48M48 29 29 48M48 36 36 48M48 43 43 48"
      />
      <path fill="none" stroke="var(--glaze-ink)" strokeWidth="2.4" d="M1.2 1.2h45.6v45.6H1.2z" />
      <path fill="var(--paper)" d="M10 15h28v18H10z" />
      <path fill="var(--glaze-ink)" d="M12 17h24v5H12zM12 26h24v5H12z" />
    </>
  ),
};

interface Props {
  of: Mark;
  size?: 's' | 'l';
  className?: string;
  /** What it is called when no word stands beside it. */
  label?: string;
}

export function VerdictMark({ of, size = 's', className = '', label }: Props) {
  return (
    <svg
      className={`glyph ${size === 'l' ? 'l' : ''} ${className}`}
      viewBox="0 0 48 48"
      data-mark={of}
      focusable="false"
      {...(label === undefined ? { 'aria-hidden': true } : { role: 'img', 'aria-label': label })}
    >
      {drawings[of]}
    </svg>
  );
}
