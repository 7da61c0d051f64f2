import Link from 'next/link';
import { Row } from '../shell/row';

/** The register is empty: what to do first. */
export function EmptyRegister({ mayKeep }: { readonly mayKeep: boolean }) {
  return (
    <Row side="nothing yet" sideClass="to-lead" className="">
      <div className="empty">
        <span className="bed" aria-hidden="true">
          <span className="tile" />
          <span className="tile none" />
          <span className="tile none" />
        </span>
        <div className="empty-words">
          <p className="lead">No identity is kept yet.</p>
          <p className="text quiet">
            {mayKeep ? (
              <>
                Type one on the bench and press <kbd>K</kbd>; it is checked and kept here.
              </>
            ) : (
              'An author of the group types one on the bench and keeps it; then it stands here.'
            )}
          </p>
        </div>
        <Link className="btn" href="/bench">
          To the bench
        </Link>
      </div>
    </Row>
  );
}

/** Nothing fits what is looked for. */
export function NoMatch() {
  return (
    <Row side="nothing found" sideClass="to-lead" className="">
      <p className="lead">No identity fits what is looked for.</p>
      <p className="text quiet mt-2">
        Every word must occur, or begin a word that does: in a name, a statement, a hypothesis, a reference or a remark.
      </p>
      <p className="mt-4">
        <Link className="btn" href="/register" replace scroll={false}>
          Drop the filters
        </Link>
      </p>
    </Row>
  );
}
