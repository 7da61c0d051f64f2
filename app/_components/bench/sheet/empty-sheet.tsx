import { Button } from '../../button/button';
import { Row } from '../../shell/row';
import { examples } from '../examples';
import { fieldFace } from '../field-face';
import { Formula } from '../../math/formula';
import type { BenchState } from '../use-bench';

/** Nothing is written yet: what to do first, and statements to begin with. */
export function EmptySheet({ bench }: { readonly bench: BenchState }) {
  const first = examples[0];
  return (
    <main className="sheet bench-sheet" id="sheet" tabIndex={-1}>
      <Row side="nothing yet" sideClass="to-lead" className="">
        <div className="empty">
          <span className="bed" aria-hidden="true">
            <span className="tile" />
            <span className="tile none" />
            <span className="tile none" />
          </span>
          <div className="empty-words">
            <p className="lead">Write two words with = between them, to have them compared.</p>
            <p className="text quiet">
              A word alone is brought to its canonical form. The answer comes here as you type.
            </p>
          </div>
          {first && (
            <Button keyName="I" tip="Back to the line" onClick={() => bench.line.current?.focus()}>
              To the line
            </Button>
          )}
        </div>
      </Row>
      <Row side="to begin with" sideClass="to-lead" id="examples">
        <ul className="examples">
          {examples.map((example) => {
            const face = fieldFace(example.field);
            return (
              <li key={example.statement}>
                <button type="button" className="plain path" onClick={() => bench.write(example)}>
                  {example.statement}
                </button>
                <span className="text quiet">
                  over {face.tex === undefined ? <i>{face.word}</i> : <Formula tex={face.tex} />}: {example.shows}
                </span>
              </li>
            );
          })}
        </ul>
      </Row>
    </main>
  );
}
