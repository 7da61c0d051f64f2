'use client';

import { Button } from './_components/button/button';

/** What stands on the sheet when a page could not be made. What was typed is kept as a draft in the browser. */
export default function PageError({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <main className="sheet" id="sheet" tabIndex={-1}>
      <div className="row" role="alert">
        <span />
        <div>
          <h1 className="text-title">This page could not be made.</h1>
          <p className="text mt-3">
            The fault is on our side. What you typed is kept on this device. Read the page again; if it stays so, tell
            whoever runs this server{error.digest === undefined ? '' : `, with the mark ${error.digest}`}.
          </p>
          <p className="mt-6">
            <Button onClick={reset}>Read again</Button>
          </p>
        </div>
      </div>
    </main>
  );
}
