import type { ReactNode } from 'react';
import { Logo } from '../marks/logo';

interface Props {
  title: ReactNode;
  /** What stands between the title and the form. */
  lead?: ReactNode;
  children?: ReactNode;
}

/** A slab one comes in by: the mark at the side, a title, and what one gives to be let in. */
export function Door({ title, lead, children }: Props) {
  return (
    <section className="slab" aria-labelledby="door-title">
      <div className="row door-row">
        <span className="door-mark">
          <Logo />
        </span>
        <div className="door">
          <h1 id="door-title">{title}</h1>
          {lead !== undefined && <p className="text">{lead}</p>}
          {children}
        </div>
      </div>
    </section>
  );
}
