import Link from 'next/link';
import { contracts } from '@/lib/openapi/contracts';
import { ruleOf } from '@/lib/permissions';
import { Row } from '../../_components/shell/row';

const ask = `curl http://127.0.0.1:3000/api/v1/compare \\
  -H 'Content-Type: application/json' \\
  -d '{"field": "Q", "left": "[5][6]", "right": "[-1][6]"}'`;

/** The calls as their contracts have them, those for everyone apart from those for members. */
const calls = contracts.map(({ method, path, summary, permission }) => ({
  name: `${method} ${path}`,
  summary,
  open: ruleOf(permission).from === 'visitor',
}));

const Calls = ({ open }: { open: boolean }) => (
  <dl className="terms calls">
    {calls
      .filter((call) => call.open === open)
      .map(({ name, summary }) => (
        <div key={name}>
          <dt>
            <code>{name}</code>
          </dt>
          <dd>{summary}</dd>
        </div>
      ))}
  </dl>
);

export function Rest() {
  return (
    <Row side="REST" id="rest" className="sec ruled">
      <div className="prose">
        <p>
          A script asks the same engine. JSON goes in and comes out, no account is needed for computations, and
          everything mathematical comes as <code>text</code>, which the language reads back, and as <code>tex</code>.
        </p>
        <pre className="cite" tabIndex={0} role="group" aria-label="Example of a request">
          {ask}
        </pre>
        <Calls open />
        <p>
          With a <a href="#tokens">token</a> of a member it also reads and fills the register. To keep one takes an{' '}
          <code>Idempotency-Key</code>: sent again within a day with the same body it makes nothing new. A revision
          names in <code>base</code> the one it was begun from; if there is a newer one, the answer is a 409 with it in{' '}
          <code>current</code>. Lists come in pages, with a cursor for the next one.
        </p>
        <Calls open={false} />
        <p>
          Each address, and each token, has a quota of questions in a minute; the headers of an answer say what is left,
          and a 429 says in <code>Retry-After</code> how long to wait. A question may use two seconds of computing time;
          past it the answer is a 503 that says with what the time was spent.{' '}
          <Link href="/help/api">Every call, to read and to try</Link>; the description for programs is{' '}
          <a href="/api/v1/openapi.json">OpenAPI 3.1</a>.
        </p>
      </div>
    </Row>
  );
}
