import Link from 'next/link';
import { Row } from '../../_components/shell/row';

const ask = `curl http://127.0.0.1:3000/api/v1/compare \\
  -H 'Content-Type: application/json' \\
  -d '{"field": "Q", "left": "[5][6]", "right": "[-1][6]"}'`;

const calls = [
  { path: 'POST /api/v1/normalize', says: 'the canonical form of an expression, by degree' },
  { path: 'POST /api/v1/compare', says: 'a verdict on two sides, or on a statement or chain, with its evidence' },
  { path: 'POST /api/v1/compare/many', says: 'up to 500 comparisons; answers in order, each with its own status' },
  {
    path: 'POST /api/v1/residues',
    says: 'residues and specialisations, at named places or wherever the class ramifies',
  },
  { path: 'GET /api/v1/health', says: 'whether the service and its database answer' },
];

export function Rest() {
  return (
    <Row side="REST" id="rest" className="sec ruled">
      <div className="prose">
        <p>
          A script asks the same engine. JSON goes in and comes out, no account is needed, and everything mathematical
          comes as <code>text</code>, which the language reads back, and as <code>tex</code>.
        </p>
        <pre className="cite" tabIndex={0} role="group" aria-label="Example of a request">
          {ask}
        </pre>
        <dl className="terms calls">
          {calls.map((call) => (
            <div key={call.path}>
              <dt>
                <code>{call.path}</code>
              </dt>
              <dd>{call.says}</dd>
            </div>
          ))}
        </dl>
        <p>
          Each address has a quota of questions in a minute; the headers of an answer say what is left, and a 429 says
          in <code>Retry-After</code> how long to wait. A question may use two seconds of computing time; past it the
          answer is a 503 that says with what the time was spent.{' '}
          <Link href="/help/api">Every call, to read and to try</Link>; the description for programs is{' '}
          <a href="/api/v1/openapi.json">OpenAPI 3.1</a>.
        </p>
      </div>
    </Row>
  );
}
