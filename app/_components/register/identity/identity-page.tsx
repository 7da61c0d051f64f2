import '../../bench/sheet/sheet.css';
import '../identity.css';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { LongFormula } from '../../bench/sheet/long-formula';
import { Colophon } from '../../shell/colophon';
import { Row } from '../../shell/row';
import { sayingOf } from '../saying';
import { Citations } from './citations';
import { EvidenceRows } from './evidence-rows';
import { HoldsFor } from './holds-for';
import { IdentityDeeds } from './identity-deeds';
import { IdentityHead } from './identity-head';
import { IdentityNotes } from './identity-notes';
import { Reference } from './reference';
import { RevisionsTable } from './revisions-table';
import type { Viewer } from './viewer';

interface Props {
  readonly identity: IdentityAnswer;
  readonly viewer: Viewer;
  readonly bibtex: string;
  readonly tex: string;
}

/** The statement, or the class, with its hypotheses, as the bench takes it. */
const lineOf = ({ statement, hypotheses }: IdentityAnswer): string =>
  [statement.text, ...hypotheses.map(({ text }) => text)].join('; ');

/** How the field stands beside the statement: what is not confirmed is claimed only. */
const claimOf = ({ state, warning, lastCheck }: IdentityAnswer): string =>
  warning ? 'over' : state !== 'withdrawn' && lastCheck?.verdict === 'equal' ? 'holds for' : 'claimed for';

/** One identity, at its current revision or at an earlier one: what it says, why, how it came about, and how to cite it. */
export function IdentityPage({ identity, viewer, bibtex, tex }: Props) {
  const saying = sayingOf(identity);
  const past = identity.revision !== identity.current;
  const mayCheck = viewer.mayWrite && !past;
  return (
    <>
      <IdentityHead identity={identity} viewer={viewer} past={past} />
      <main className="sheet spread identity-sheet" id="sheet" tabIndex={-1}>
        <div className="set" id="statement">
          {identity.warning && <p className="lead warned">Not equal:</p>}
          <p>
            <LongFormula text={saying.text} tex={saying.tex} />
          </p>
        </div>
        <div className="facts-rows">
          <Row side={claimOf(identity)} id="holds-for" className="tight first">
            <HoldsFor identity={identity} />
          </Row>
          <Row side="reference" id="reference" className="tight">
            <Reference identity={identity} />
          </Row>
        </div>
        <EvidenceRows identity={identity} mayCheck={mayCheck} />
        <Row side="revisions" id="revisions" className="sec ruled">
          <RevisionsTable identity={identity} />
        </Row>
        {identity.remark !== undefined && (
          <Row side="remark" id="remark" className="sec ruled">
            <p className="note">{identity.remark}</p>
          </Row>
        )}
        <Row side="cite" id="cite" className="sec ruled">
          <Citations bibtex={bibtex} tex={tex} />
        </Row>
        <IdentityNotes identity={identity}>
          <IdentityDeeds
            identityKey={identity.key}
            revision={identity.revision}
            past={past}
            text={saying.text}
            tex={saying.tex}
            field={identity.field.text}
            line={lineOf(identity)}
            visibility={identity.visibility}
            tags={identity.tags}
            viewer={viewer}
          />
        </IdentityNotes>
      </main>
      <Colophon />
    </>
  );
}
