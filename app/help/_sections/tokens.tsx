import Link from 'next/link';
import { longestLife, mostTokens } from '@/lib/tokens/limits';
import { scopeWords } from '@/lib/tokens/scopes';
import { Row } from '../../_components/shell/row';

const ask = `curl http://127.0.0.1:3000/api/v1/identities \\
  -H 'Authorization: Bearer qdl_…' \\
  -H 'Content-Type: application/json' \\
  -H 'Idempotency-Key: night-run-2026-11-03-1' \\
  -d '{"name": "Steinberg at six", "field": "Q", "statement": "[5][6] = [-1][6]"}'`;

/** Tokens and scopes, with an example that keeps an identity. */
export function Tokens() {
  return (
    <Row side="tokens" id="tokens" className="sec ruled">
      <div className="prose">
        <p>
          With a token a script acts for the member who made it, in the group for which it was made, within the role
          that the member has at that moment. Make one on the page <Link href="/account/tokens">Tokens</Link>: it is
          shown once, and only a digest of it is kept.
        </p>
        <dl className="terms">
          {Object.entries(scopeWords).map(([scope, says]) => (
            <div key={scope}>
              <dt>
                <code>{scope}</code>
              </dt>
              <dd>
                {says}
                {scope === 'write' && ', for authors and above'}
              </dd>
            </div>
          ))}
        </dl>
        <pre className="cite" tabIndex={0} role="group" aria-label="Example of a request with a token">
          {ask}
        </pre>
        <p>
          A token holds for at most {longestLife} days, and a member has at most {mostTokens} that work. Revoking ends
          one at once; a steward can revoke any of the group. Whoever leaves the group takes none along.{' '}
          <code>GET /api/v1/token</code> says whom a token acts for, what its scopes are and when it expires. Its quota
          of questions is its own, apart from that of the address.
        </p>
      </div>
    </Row>
  );
}
