import { Formula } from '../../math/formula';
import { VerdictMark } from '../../marks/verdict-mark';
import { LongFormula } from '../../bench/sheet/long-formula';
import { verdictWord } from '../../bench/verdict-words';
import type { ResidueFound } from './use-residue';

/** What the residue is, and whether it is the value that is written. */
export function ResidueAnswer({ found }: { readonly found: ResidueFound }) {
  const { residue, compared, declined } = found;
  const verdict = declined === undefined ? compared?.verdict : undefined;
  return (
    <div className="row verdict">
      {verdict ? (
        <span className="mark" key={verdict}>
          <VerdictMark of={verdict} size="l" />
        </span>
      ) : declined === undefined ? (
        <span className="mark mark-tile mark-blank" />
      ) : (
        <VerdictMark of="unread" size="l" className="mark" />
      )}
      <div role="status">
        {verdict && <h2>{verdictWord[verdict]}</h2>}
        {declined !== undefined && <p className="lead">{declined}</p>}
        {declined === undefined && residue && (
          <p className="lead">
            The residue is <LongFormula text={residue.value.text} tex={residue.value.tex} /> over{' '}
            <Formula tex={residue.residueFieldTex} />, against the uniformizer <Formula tex={residue.uniformizerTex} />
            {verdict === 'different' ? ', and not the value that is written.' : '.'}
          </p>
        )}
        {declined === undefined && !residue && (
          <p className="lead quiet">Write the class and the place; the residue comes here.</p>
        )}
      </div>
    </div>
  );
}
