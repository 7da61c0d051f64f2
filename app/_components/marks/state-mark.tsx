import type { ReactNode } from 'react';

export type MarkedState = 'draft' | 'checked' | 'withdrawn';

/** How far an identity has come: an outline, its lower half laid, an outline struck. */
const drawings: Record<MarkedState, ReactNode> = {
  draft: <path fill="none" stroke="var(--ink-2)" strokeWidth="1.5" d="M.75.75h16.5v16.5H.75z" />,
  checked: (
    <>
      <path fill="var(--glaze)" d="M0 9h18v9H0z" />
      <path fill="none" stroke="var(--glaze-ink)" strokeWidth="1.5" d="M.75.75h16.5v16.5H.75z" />
    </>
  ),
  withdrawn: <path fill="none" stroke="var(--ink)" strokeWidth="1.5" d="M.75.75h16.5v16.5H.75zM17 1 1 17" />,
};

export const stateWord: Record<MarkedState, string> = { draft: 'Draft', checked: 'Checked', withdrawn: 'Withdrawn' };

/** Always beside its word. */
export function StateMark({ of }: { readonly of: MarkedState }) {
  return (
    <svg className="glyph" viewBox="0 0 18 18" data-state={of} focusable="false" aria-hidden="true">
      {drawings[of]}
    </svg>
  );
}
