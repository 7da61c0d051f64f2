/** What stands where no token is yet: what to do first. */
export function NoTokens() {
  return (
    <div className="empty">
      <span className="bed" aria-hidden="true">
        <span className="tile" />
        <span className="tile none" />
        <span className="tile none" />
      </span>
      <div className="empty-words">
        <p className="lead">No token is made yet.</p>
        <p className="text quiet">Give one a name above, and choose what the script may do.</p>
      </div>
    </div>
  );
}
