import { Formula } from '../../math/formula';
import { type Mark, VerdictMark } from '../../marks/verdict-mark';
import type { Answer } from '../ask';
import { type Phrase, Said } from '../phrase';
import { chainPhrase, formPhrase, verdictPhrase, verdictWord } from '../verdict-words';
import { LongFormula } from './long-formula';
import { wholeForm } from './whole-form';

function markOf(answer: Extract<Answer, { kind: 'statement' }>, old: boolean): Mark {
  return old && answer.body.verdict === 'equal' ? 'old' : answer.body.verdict;
}

function StatementVerdict({ answer, old }: { answer: Extract<Answer, { kind: 'statement' }>; old: boolean }) {
  const mark = markOf(answer, old);
  const chain = (answer.body.chain?.length ?? 0) > 1;
  const phrase: Phrase = chain ? chainPhrase(answer.body) : verdictPhrase(answer.body);
  return (
    <div className="row verdict">
      <span className={`mark ${old && mark !== 'old' ? 'mark-old' : ''}`} key={mark}>
        <VerdictMark of={mark} size="l" />
      </span>
      <div>
        <h2>{verdictWord[answer.body.verdict]}</h2>
        <p className="lead">
          <Said phrase={phrase} />
        </p>
      </div>
    </div>
  );
}

function ExpressionForm({ answer }: { answer: Extract<Answer, { kind: 'expression' }> }) {
  const form = wholeForm(answer.body.parts);
  return (
    <div className="row verdict">
      <span className="mark mark-tile" aria-hidden="true">
        <Formula tex="[\,]" />
      </span>
      <div>
        <h2 className={form.text.length > 40 ? 'form-long' : undefined}>
          <LongFormula text={form.text} tex={form.tex} />
        </h2>
        <p className="lead">
          <Said phrase={formPhrase(answer.body)} />
        </p>
      </div>
    </div>
  );
}

/** The large tile, the word, and the sentence that finishes it; or the canonical form at the size of a verdict. */
export function VerdictRow({ answer, old }: { readonly answer: Answer; readonly old: boolean }) {
  return answer.kind === 'statement' ? (
    <StatementVerdict answer={answer} old={old} />
  ) : (
    <ExpressionForm answer={answer} />
  );
}

interface WithoutAnswer {
  /** The line cannot be read. */
  readonly unread: boolean;
  /** Why a line that can be read is not answered. */
  readonly refusal: string | undefined;
}

/** Where there is no answer: the line cannot be read, or is not answered; else a tile that is still empty. */
export function UnansweredRow({ unread, refusal }: WithoutAnswer) {
  const word = unread ? 'Unread' : refusal === undefined ? undefined : 'Unanswered';
  return (
    <div className="row verdict">
      {word ? <VerdictMark of="unread" size="l" className="mark" /> : <span className="mark mark-tile mark-blank" />}
      <div>
        {word && <h2>{word}</h2>}
        {word && (
          <p className="lead">
            {unread ? 'The note under the line says how far it can be read, and why no further.' : refusal}
          </p>
        )}
      </div>
    </div>
  );
}
