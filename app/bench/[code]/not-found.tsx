import Link from 'next/link';
import { Colophon } from '../../_components/shell/colophon';
import { Row } from '../../_components/shell/row';

/** A code under which nothing is kept. */
export default function UnknownLink() {
  return (
    <>
      <section className="slab" aria-label="Where you are">
        <Row side="not found">
          <h1>There is nothing here that you can see.</h1>
        </Row>
      </section>
      <main className="sheet" id="sheet" tabIndex={-1}>
        <Row side="what to do">
          <p className="lead">
            The link may have been cut short when it was copied: its last part has at least ten characters.
          </p>
          <p className="acts mt-4">
            <Link className="plain" href="/bench">
              To the bench
            </Link>
          </p>
        </Row>
      </main>
      <Colophon />
    </>
  );
}
