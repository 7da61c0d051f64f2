'use client';

import Link from 'next/link';
import { useMemo } from 'react';
import { readFieldName } from '@/grammar/read';
import { Button } from '../../button/button';
import { useKey } from '../../keys/keys-provider';
import { Formula } from '../../math/formula';
import type { Answer } from '../ask';
import { benchAddress } from '../bench-address';
import { fieldMeaning } from '../field-meaning';
import type { Phrase } from '../phrase';
import { KeepButton } from '../keeping';
import type { BenchState } from '../use-bench';
import { Deeds } from './deeds';
import { useDifference } from './difference';
import { EmptySheet } from './empty-sheet';
import { ExpressionEvidence } from './expression-evidence';
import { LongFormula } from './long-formula';
import { Notes } from './notes';
import { StatementEvidence } from './statement-evidence';
import { UnansweredRow, VerdictRow } from './verdict-row';
import { wholeForm } from './whole-form';

/** What is copied: a statement as it was understood, an expression together with its canonical form. */
function copied(answer: Answer): { text: string; tex: string } {
  if (answer.kind === 'statement') return answer.body.statement;
  const form = wholeForm(answer.body.parts);
  const { expression } = answer.body;
  return { text: `${expression.text} = ${form.text}`, tex: `${expression.tex} = ${form.tex}` };
}

/** What the name and the answer together say about the field. */
function meaningOf(answer: Answer): Phrase | undefined {
  try {
    return fieldMeaning(readFieldName(answer.body.field.text), answer.body.field);
  } catch {
    return undefined;
  }
}

/** A term longer than this is not written on a button. */
const shortTerm = 24;

/** The one thing an answer calls for: the missing term, or another side to compare with. */
function Repair({ bench, answer }: { readonly bench: BenchState; readonly answer: Answer }) {
  const { line, asked } = bench;
  const statement = answer.kind === 'statement' && answer.body.sides.length === 2 ? answer.body : undefined;
  const counterexample = statement?.evidence.counterexample;
  const different = statement?.verdict === 'different' && !counterexample;
  const form = useDifference(
    answer.body.field.text,
    statement?.sides[0],
    statement?.sides[1],
    different && asked.current,
  );
  const unavailable = asked.current ? undefined : 'Only a current answer can be worked on';
  const compare = () => line.current?.append(' = ');
  const expression = answer.kind === 'expression';
  useKey({ keyName: '=', label: 'compare it with another', act: compare, enabled: expression && asked.current });
  const add = () => {
    if (!form) return;
    const line = `${answer.question.text} ${form.text.startsWith('-') ? form.text : `+ ${form.text}`}`;
    bench.put(line);
  };
  useKey({
    keyName: 'A',
    label: 'add the missing term',
    act: add,
    enabled: different && form !== undefined && asked.current,
  });
  if (expression)
    return (
      <p>
        <Button wide keyName="=" tip="Put it on the left of an equation" unavailable={unavailable} onClick={compare}>
          Compare it with another
        </Button>
      </p>
    );
  if (counterexample)
    return (
      <p>
        <Link className="btn wide" href={benchAddress(counterexample.field.text, counterexample.statement.text)}>
          Open it over <Formula tex={counterexample.field.tex} />
        </Link>
      </p>
    );
  if (!different || !form?.repairs || answer.question.text.includes(';')) return null;
  return (
    <p>
      <Button wide keyName="A" tip="Put the missing term on the right side" unavailable={unavailable} onClick={add}>
        Add {form.text.length <= shortTerm ? <Formula tex={form.tex} /> : 'the missing term'} on the right
      </Button>
    </p>
  );
}

/** Why the service gives no verdict on a statement that can still be kept as a draft. */
const undecidedCodes: readonly (string | undefined)[] = ['not-yet', 'budget', 'size'];

/** The sheet: the statement as it is set, the verdict, and what it rests on. An answer to an earlier text is marked old. */
export function Sheet({ bench }: { readonly bench: BenchState }) {
  const { asked, question, reading, live, noted, fault } = bench;
  const { answer, current } = asked;
  const meaning = useMemo(() => (answer ? meaningOf(answer) : undefined), [answer]);
  if (reading?.state === 'empty') return <EmptySheet bench={bench} />;
  const old = answer !== undefined && !current;
  const refusal = asked.declined && (fault?.message ?? asked.declined.message);
  const oldSaid = old && (noted || asked.slow || asked.stopped || asked.declined !== undefined || asked.offline);
  const shown = answer && (answer.kind === 'statement' ? answer.body.statement : answer.body.expression);
  const set = live ? { text: live.text, tex: live.tex } : shown;
  const statement = answer?.kind === 'statement' ? answer.body : undefined;
  const open = question?.kind === 'statement' && undecidedCodes.includes(asked.declined?.problem?.code);
  return (
    <main
      className={`sheet spread bench-sheet ${old ? 'is-old' : ''}`}
      id="sheet"
      tabIndex={-1}
      aria-busy={asked.waiting}
    >
      {oldSaid && (
        <p className="old">
          <b>Old answer.</b>{' '}
          {live
            ? 'It belongs to the text before, and changes when the new one is answered.'
            : 'It belongs to the last text that could be read, and changes when the line above can be read again.'}
        </p>
      )}
      {set && (
        <p className="set">
          <LongFormula text={set.text} tex={set.tex} />
        </p>
      )}
      {answer ? (
        <VerdictRow answer={answer} old={old} />
      ) : (
        <UnansweredRow unread={reading?.state === 'unread' && noted} refusal={refusal} />
      )}
      {!answer && open && (
        <div className="deeds">
          <p>
            <KeepButton question={question} current />
          </p>
        </div>
      )}
      {answer && (
        <>
          <Deeds
            field={answer.question.field}
            line={answer.question.text}
            {...copied(answer)}
            repair={
              <>
                {open && (
                  <p>
                    <KeepButton question={question} current />
                  </p>
                )}
                {!open && statement && statement.verdict !== 'different' && (
                  <p>
                    <KeepButton question={answer.question} verdict={statement.verdict} current={current} />
                  </p>
                )}
                <Repair bench={bench} answer={answer} />
              </>
            }
          />
          {answer.kind === 'statement' ? (
            <StatementEvidence key={`${answer.question.field} ${answer.question.text}`} answer={answer.body} />
          ) : (
            <ExpressionEvidence
              answer={answer.body}
              expression={answer.question.under?.expression ?? answer.question.text}
            />
          )}
          <Notes answer={answer} current={current} meaning={meaning} onWrite={bench.put} />
        </>
      )}
    </main>
  );
}
