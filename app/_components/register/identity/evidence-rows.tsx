import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { AskClient } from '../../bench/ask-client';
import { Said, withFormulas } from '../../bench/phrase';
import { ResidueTable } from '../../bench/sheet/residue-table';
import { StatementEvidence } from '../../bench/sheet/statement-evidence';
import { chainPhrase, verdictPhrase } from '../../bench/verdict-words';
import { VerdictMark } from '../../marks/verdict-mark';
import { Row } from '../../shell/row';
import { checkMark, checkWord } from '../check-words';
import { CheckAgain } from './check-again';

interface Props {
  readonly identity: IdentityAnswer;
  readonly mayCheck: boolean;
}

/** The verdict of the last check, and the sentence that finishes it. */
function Found({ identity }: { readonly identity: IdentityAnswer }) {
  const { lastCheck, evidence, kind } = identity;
  if (!lastCheck) return <p className="text quiet">It has not been checked.</p>;
  const compare = evidence?.compare;
  const chain = (compare?.chain?.length ?? 0) > 1;
  return (
    <p className="text">
      <span className="with-glyph">
        <VerdictMark of={checkMark[lastCheck.verdict]} />
        <span>
          <b>{checkWord[lastCheck.verdict]}</b>
          {compare && kind === 'equality' ? (
            <>
              {', '}
              <Said phrase={chain ? chainPhrase(compare) : verdictPhrase(compare)} />
            </>
          ) : (
            <>. {evidence?.sentence ?? lastCheck.sentence}</>
          )}
        </span>
      </span>
    </p>
  );
}

/** What the last check rests on: the floor of tiles, what was compared, the theorem, and what it does not replace. */
export function EvidenceRows({ identity, mayCheck }: Props) {
  const { evidence } = identity;
  const compare = evidence?.compare;
  const theorem = compare?.evidence.theorem ?? '';
  return (
    <div className="evidence-rows">
      <Row side="evidence" id="evidence" className="sec ruled" sideClass="">
        <Found identity={identity} />
        {evidence?.residues && (
          <div className="mt-4">
            <ResidueTable answer={evidence.residues} only />
          </div>
        )}
      </Row>
      {compare && (
        <AskClient>
          <StatementEvidence key={identity.lastCheck?.at} answer={compare} />
        </AskClient>
      )}
      <Row className="sec close" label="What it rests on">
        {theorem !== '' && (
          <p className="text quiet measure">
            <Said phrase={withFormulas(theorem)} />
          </p>
        )}
        <p className="text quiet measure mt-2">
          A verdict is a computation under stated hypotheses. It does not replace refereeing.
        </p>
        {mayCheck && (
          <p className="acts mt-3">
            <CheckAgain identityKey={identity.key} />
          </p>
        )}
      </Row>
    </div>
  );
}
