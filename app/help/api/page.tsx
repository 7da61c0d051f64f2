import type { Metadata } from 'next';
import Link from 'next/link';
import { ApiReference } from '../../_components/api/api-reference';
import { Colophon } from '../../_components/shell/colophon';

export const metadata: Metadata = { title: 'API' };

export default function ApiPage() {
  return (
    <>
      <section className="slab" aria-label="About this page">
        <div className="row">
          <p className="side help-side">help</p>
          <div>
            <h1 className="text-title">The API, call by call</h1>
            <p className="text mt-1 max-w-[44em]">
              JSON in, JSON out, no account. A short introduction with an example stands in the{' '}
              <Link href="/help#rest">help</Link>; programs read <a href="/api/v1/openapi.json">the OpenAPI document</a>
              .
            </p>
          </div>
        </div>
      </section>
      <main className="sheet" id="sheet" tabIndex={-1}>
        <ApiReference url="/api/v1/openapi.json" />
      </main>
      <Colophon />
    </>
  );
}
