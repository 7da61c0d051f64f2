'use client';

import '../../bench/sheet/sheet.css';
import '../../bench/slab/slab.css';
import '../identity.css';
import './writing.css';
import { useMemo, useState } from 'react';
import type { IdentityDraft, IdentityForm } from '@/lib/contracts/identity-draft';
import type { IdentityOutcome } from '@/lib/contracts/identity-outcome';
import { AskClient } from '../../bench/ask-client';
import { LongFormula } from '../../bench/sheet/long-formula';
import { UnansweredRow, VerdictRow } from '../../bench/sheet/verdict-row';
import { SlabRow } from '../../bench/slab/slab-row';
import { useBench } from '../../bench/use-bench';
import { Button } from '../../button/button';
import { Course } from '../../button/course';
import { ActionForm } from '../../form/action-form';
import { SendButton } from '../../form/send-button';
import { Row } from '../../shell/row';
import { Slip } from '../../slip/slip';
import { ConflictRows } from './conflict-rows';
import { formOf } from './form-values';
import { NamingRows } from './naming-rows';
import { ResidueAnswer } from './residue-answer';
import { ResidueFields } from './residue-fields';
import { useKeptDraft } from './use-kept-draft';
import { useResidue } from './use-residue';
import { WhatHappens } from './what-happens';

interface Props {
  readonly draftKey: string;
  readonly start: IdentityForm;
  /** The revision that is changed; absent for a new identity. */
  readonly base?: number;
  readonly drafted: IdentityDraft | undefined;
  readonly title: string;
  readonly side: string;
  /** Sends the form; answers only when it was not kept. */
  readonly send: (base: number | undefined, form: IdentityForm) => Promise<IdentityOutcome>;
  /** Where one goes without keeping anything. */
  readonly leave: React.ReactNode;
}

const kinds = [
  { value: 'equality', label: 'an equality' },
  { value: 'residue', label: 'a residue' },
] as const;

/** The sentence over a line that does not say what it should. */
function lineFault(kind: IdentityForm['kind'], reading: ReturnType<typeof useBench>['reading']): string | undefined {
  if (reading === undefined || reading.state === 'empty') return undefined;
  if (reading.state === 'unread') return 'It cannot be read. The note under the line says where, and why.';
  if (kind === 'equality' && reading.kind === 'expression')
    return 'An identity needs an equals sign between two sides.';
  if (kind === 'residue' && reading.kind === 'statement') return 'A class has no equals sign. Write one side alone.';
  return undefined;
}

function useWriting({ start, base: firstBase, send, draftKey, drafted }: Props) {
  const [rest, setRest] = useState(start);
  const [base, setBase] = useState(firstBase);
  const [outcome, setOutcome] = useState<IdentityOutcome>({});
  const opened = useMemo(() => ({ field: start.field, statement: start.statement }), [start]);
  const bench = useBench(opened);
  const { field, text, asked, reading } = bench;
  const { kind, place, uniformizer, value } = rest;
  const residue = useResidue({ field, expression: text, place, uniformizer, value }, kind === 'residue');
  const answer = kind === 'equality' && asked.answer?.kind === 'statement' ? asked.answer : undefined;
  const verdict =
    kind === 'residue'
      ? residue.current
        ? residue.compared?.verdict
        : undefined
      : asked.current
        ? answer?.body.verdict
        : undefined;
  // What is found decides; where nothing is, a warning stays one.
  const warning = verdict === 'different' || (verdict !== 'equal' && rest.warning);
  const form = useMemo(() => ({ ...rest, field, statement: text, warning }), [rest, field, text, warning]);
  const kept = useKeptDraft({ draftKey, form: { ...form, warning: rest.warning }, base, start, drafted });

  const write = (changes: Partial<IdentityForm>) => {
    setRest((before) => ({ ...before, ...changes }));
    const wrong = outcome.errors;
    if (wrong)
      setOutcome({
        ...outcome,
        errors: { ...wrong, ...Object.fromEntries(Object.keys(changes).map((key) => [key, undefined])) },
      });
  };
  const take = (next: IdentityForm, nextBase: number | undefined) => {
    setRest(next);
    setBase(nextBase);
    setOutcome({});
    bench.write({ field: next.field, statement: next.statement });
  };
  const action = async (): Promise<IdentityOutcome> => {
    kept.pause();
    const line = reading?.state === 'empty' ? undefined : lineFault(kind, reading);
    const result = line === undefined ? await send(base, form) : { errors: { statement: line } };
    // A form that was kept is left; there is nothing to show here any more.
    const next = (result as IdentityOutcome | undefined) ?? {};
    setOutcome(next);
    if (next.errors?.statement !== undefined || next.errors?.field !== undefined) bench.line.current?.focus();
    return next;
  };
  return { bench, form, rest, base, outcome, residue, answer, verdict, kept, write, take, action };
}

const keepWords = { equal: 'Keep as identity', different: 'Keep as a warning', none: 'Keep as a draft' } as const;

function Writing(props: Props) {
  const { title, side, leave } = props;
  const { bench, form, base, outcome, residue, answer, verdict, kept, write, take, action } = useWriting(props);
  const { asked, live, reading, noted, fault } = bench;
  const revising = props.base !== undefined;
  const { errors, conflict } = outcome;
  const lineError = errors?.statement ?? errors?.field;
  const old = answer !== undefined && !asked.current;
  const shown = live ?? (answer ? answer.body.statement : undefined);
  const decided = verdict === 'equal' || verdict === 'different' ? verdict : 'none';
  const offer = kept.offered;
  return (
    <>
      <section className="slab writing-slab" aria-label="What it says">
        <div className="row">
          <p className="side to-title">{side}</p>
          <div className="headed">
            <h1>{title}</h1>
            <Course label="What is kept" options={kinds} value={form.kind} onChange={(kind) => write({ kind })} />
          </div>
        </div>
        {offer && (
          <div className="writing-slip">
            <Slip
              kind="ask"
              onClose={kept.leave}
              action={
                <Button
                  kind="plain"
                  onClick={() => {
                    take(offer.form, revising ? (offer.base ?? props.base) : undefined);
                    kept.taken();
                  }}
                >
                  Go on with it
                </Button>
              }
            >
              Your text was kept.
            </Slip>
          </div>
        )}
        <SlabRow bench={bench} label={form.kind === 'residue' ? 'Class' : 'Statement'} />
        {form.kind === 'residue' && <ResidueFields form={form} errors={errors} found={residue} onWrite={write} />}
      </section>
      <main className={`sheet spread writing-sheet ${old ? 'is-old' : ''}`} id="sheet" tabIndex={-1}>
        {conflict && revising && (
          <ConflictRows
            current={conflict}
            yours={form}
            onGoOn={() => take(form, conflict.current)}
            onTakeTheirs={() => take(formOf(conflict, conflict.visibility), conflict.current)}
          />
        )}
        <p className="set">{shown ? <LongFormula text={shown.text} tex={shown.tex} /> : '\u00a0'}</p>
        {form.kind === 'residue' ? (
          <ResidueAnswer found={residue} />
        ) : answer ? (
          <VerdictRow answer={answer} old={old} />
        ) : (
          <UnansweredRow
            unread={reading?.state === 'unread' && noted}
            refusal={asked.declined && (fault?.message ?? asked.declined.message)}
          />
        )}
        <ActionForm action={action} label={title} className="writing-form">
          {lineError !== undefined && (
            <Row className="sec" label="What has to change in the line">
              <Slip kind="ask">{lineError}</Slip>
            </Row>
          )}
          <NamingRows form={form} onWrite={write} revising={revising} />
          <Row className="sec" label="Keep it">
            <div className="form-acts">
              <SendButton>
                {revising ? `Keep as revision ${(base ?? 0) + 1}` : keepWords[asked.waiting ? 'equal' : decided]}
              </SendButton>
              {leave}
              <span className="small quiet" role="status">
                {kept.told}
              </span>
            </div>
          </Row>
        </ActionForm>
        <WhatHappens verdict={verdict} warning={form.warning} revising={revising} />
      </main>
    </>
  );
}

/** The form in which an identity is written: what it says on stone, its verdict and its names on paper. */
export function IdentityWriting(props: Props) {
  return (
    <AskClient>
      <Writing {...props} />
    </AskClient>
  );
}
