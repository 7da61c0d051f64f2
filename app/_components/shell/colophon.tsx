import type { ReactNode } from 'react';
import { engineVersion } from '@/engine/version';
import { Formula } from '../math/formula';
import { ThemeChoice } from '../theme/theme-choice';
import { KeysLink } from './keys-link';

/** The foot of every page: the conventions in force there, the keys, the theme. `children` replace the conventions. */
export function Colophon({ children }: { children?: ReactNode }) {
  return (
    <footer className="colophon">
      <div className="row">
        <span />
        <div>
          {children ?? (
            <>
              <span>
                Conventions here: <Formula tex="\pf{a} = 1 - \q{a}" />
              </span>
              <span>residues against the named uniformizer</span>
              <span>
                Hasse invariant over <Formula tex="i < j" />
              </span>
            </>
          )}
          <span>Engine {engineVersion}</span>
          <KeysLink />
          <ThemeChoice small />
        </div>
      </div>
    </footer>
  );
}
