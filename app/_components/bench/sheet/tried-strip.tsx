import type { CounterexampleAnswer, TriedAnswer } from '@/lib/contracts/compare';
import { Formula } from '../../math/formula';
import { Row } from '../../shell/row';
import { valuesTex } from '../values-tex';

interface Props {
  readonly tried: TriedAnswer;
  readonly counterexample: CounterexampleAnswer | undefined;
}

/** A value that fits under the cut of a tile. */
const shortValue = 12;

/** The fields in which letters got values, one tile each: how many lawful ones did not separate the sides, and where some did. */
export function TriedStrip({ tried, counterexample }: Props) {
  const agreeing = tried.fields.filter(({ field }) => field.text !== counterexample?.field.text);
  if (agreeing.length === 0 && counterexample === undefined) return null;
  const beforeIt = tried.fields.find(({ field }) => field.text === counterexample?.field.text)?.values ?? 0;
  const values = counterexample && valuesTex(counterexample.values);
  return (
    <Row side="substitutions tried" sideClass="to-strip" id="tried">
      <div className="strip-of-fields" role="table" aria-label="Substitutions tried" tabIndex={0}>
        <div role="row" className="places">
          {[...agreeing.map(({ field }) => field), ...(counterexample ? [counterexample.field] : [])].map((field) => (
            <span role="columnheader" key={field.text}>
              <Formula tex={field.tex} />
            </span>
          ))}
        </div>
        <div role="row" className="bed">
          {agreeing.map(({ field, values }) => (
            <span role="cell" key={field.text} className={`tile ${values === 0 ? 'none' : 'agree'}`}>
              {values === 0 ? '–' : values}
            </span>
          ))}
          {counterexample && (
            <span role="cell" className="tile split">
              <span className="sr">different</span>
              <span>{values !== undefined && values.length <= shortValue && <Formula tex={values} />}</span>
            </span>
          )}
        </div>
      </div>
      <p className="legend">
        <span>In each tile, how many lawful values were looked at and did not separate the sides.</span>
        {agreeing.some(({ values }) => values === 0) && <span>– no lawful value was looked at.</span>}
        {counterexample && beforeIt > 0 && (
          <span>
            Over <Formula tex={counterexample.field.tex} />, {beforeIt} before the one that does.
          </span>
        )}
      </p>
    </Row>
  );
}
