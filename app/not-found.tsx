import type { Metadata } from 'next';
import Link from 'next/link';
import { Colophon } from './_components/shell/colophon';

export const metadata: Metadata = { title: 'Nothing here' };

/** One sentence for what does not exist and for what one may not see. */
export default function NotFound() {
  return (
    <>
      <main className="sheet" id="sheet" tabIndex={-1}>
        <div className="row">
          <span />
          <div>
            <h1 className="text-title">There is nothing here that you can see.</h1>
            <p className="text mt-3">The address may be mistyped, or the link may have been cut short.</p>
            <p className="mt-6">
              <Link className="btn" href="/bench">
                To the bench
              </Link>
            </p>
          </div>
        </div>
      </main>
      <Colophon />
    </>
  );
}
