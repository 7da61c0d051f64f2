import type { Metadata } from 'next';
import { Colophon } from '../_components/shell/colophon';
import { Cautions } from './_sections/cautions';
import { Conventions } from './_sections/conventions';
import { Errors } from './_sections/errors';
import { Fields } from './_sections/fields';
import { Groups } from './_sections/groups';
import { HelpIndex } from './_sections/help-index';
import { Keys } from './_sections/keys';
import { Language } from './_sections/language';
import { Register } from './_sections/register';
import { Relations } from './_sections/relations';
import { Rest } from './_sections/rest';
import { Tokens } from './_sections/tokens';
import { Evidence, Verdicts } from './_sections/verdicts';

export const metadata: Metadata = { title: 'Help' };

/** One long sheet with an index in the notes. */
export default function Help() {
  return (
    <>
      <section className="slab" aria-label="About this page">
        <div className="row">
          <p className="side help-side">help</p>
          <div>
            <h1 className="text-title">What one may write, and what is answered</h1>
            <p className="text mt-1 max-w-[44em]">Every example opens on the bench.</p>
          </div>
        </div>
      </section>
      <main className="sheet spread help" id="sheet" tabIndex={-1}>
        <Language />
        <Fields />
        <Relations />
        <Conventions />
        <Verdicts />
        <Evidence />
        <Register />
        <Groups />
        <Keys />
        <Rest />
        <Tokens />
        <Errors />
        <Cautions />
        <aside className="notes from-top" aria-label="Index of the page">
          <HelpIndex />
        </aside>
      </main>
      <Colophon />
    </>
  );
}
