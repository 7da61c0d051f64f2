import { problemKinds } from '@/lib/contracts/problem';
import { Row } from '../../_components/shell/row';
import { MarkedText } from './marked-text';

/** Every way to be refused; `type` of a problem document leads to its line here. */
export function Errors() {
  return (
    <Row side="refusals" id="errors" className="sec ruled">
      <div className="prose">
        <p>
          A refusal says what to change. Over REST it is a problem document (RFC 9457) whose <code>type</code> leads to
          its line here and whose <code>detail</code> speaks about your request. Lines and columns count from 1, columns
          in characters; what is missing is reported where it was expected.
        </p>
        <dl className="terms">
          {Object.entries(problemKinds).map(([code, kind]) => (
            <div key={code} id={`error-${code}`}>
              <dt>
                {kind.title}
                <span className="nm">
                  <code>{code}</code> {kind.status}
                </span>
              </dt>
              <dd>
                <MarkedText text={kind.about} />
              </dd>
            </div>
          ))}
        </dl>
      </div>
    </Row>
  );
}
