'use client';

import './sheet/sheet.css';
import './slab/slab.css';
import Link from 'next/link';
import { createContext, type ReactNode, useContext, useMemo } from 'react';
import type { CompareAnswer } from '@/lib/contracts/compare';
import { VerdictMark } from '../marks/verdict-mark';
import { Formula } from '../math/formula';
import { Row } from '../shell/row';
import { Announcer } from './announcer';
import { AskClient } from './ask-client';
import { benchAddress } from './bench-address';
import type { Draft } from './drafts';
import { Said } from './phrase';
import { EvidenceFloor } from './sheet/evidence-floor';
import { LongFormula } from './sheet/long-formula';
import { wholeForm } from './sheet/whole-form';
import { SlabRow } from './slab/slab-row';
import { type BenchState, useBench } from './use-bench';
import { formPhrase, verdictPhrase, verdictWord } from './verdict-words';

const Live = createContext<BenchState | undefined>(undefined);

function useLive(): BenchState {
  const bench = useContext(Live);
  if (!bench) throw new Error('A live line stands inside LiveBench.');
  return bench;
}

function Provide({ field, statement, children }: Draft & { readonly children: ReactNode }) {
  const opened = useMemo(() => ({ field, statement }), [field, statement]);
  const bench = useBench(opened);
  return (
    <Live.Provider value={bench}>
      {children}
      <Announcer asked={bench.asked} />
    </Live.Provider>
  );
}

/** A small bench within another page: the parts below stand anywhere inside it and share one line. */
export function LiveBench({
  answer,
  ...props
}: Draft & { readonly answer?: CompareAnswer; readonly children: ReactNode }) {
  const question = { kind: 'statement', field: props.field, text: props.statement } as const;
  return (
    <AskClient known={answer && { kind: 'statement', question, body: answer }}>
      <Provide {...props} />
    </AskClient>
  );
}

/** The field and the written line. */
export function LiveSlab({ label }: { readonly label: string }) {
  return <SlabRow bench={useLive()} label={label} bare />;
}

const nothingShown = () => undefined;

function LiveVerdict({ bench }: { readonly bench: BenchState }) {
  const { asked, live } = bench;
  const { answer, current } = asked;
  const old = answer !== undefined && !current;
  const shown = answer && (answer.kind === 'statement' ? answer.body.statement : answer.body.expression);
  const set = live ?? shown;
  const mark = answer?.kind === 'statement' ? answer.body.verdict : undefined;
  return (
    <div className={`row verdict mt-0 ${old ? 'is-old' : ''}`}>
      {answer && mark === undefined ? (
        <span className="mark mark-tile" aria-hidden="true">
          <Formula tex="[\,]" />
        </span>
      ) : (
        <VerdictMark of={old && mark === 'equal' ? 'old' : (mark ?? 'unread')} size="l" className="mark" />
      )}
      <div className="live-said">
        {set && (
          <p className="set">
            <LongFormula text={set.text} tex={set.tex} />
          </p>
        )}
        {answer?.kind === 'statement' && (
          <p className="lead">
            <b>{verdictWord[answer.body.verdict]}</b> <Said phrase={verdictPhrase(answer.body)} />
          </p>
        )}
        {answer?.kind === 'expression' && (
          <p className="lead">
            <LongFormula {...wholeForm(answer.body.parts)} /> <Said phrase={formPhrase(answer.body)} />
          </p>
        )}
        {asked.declined && <p className="text quiet">{asked.declined.message}</p>}
      </div>
    </div>
  );
}

/** The verdict on what stands in the line, in one row, and its floor of tiles; `children` stand below. */
export function LiveAnswer({ children }: { readonly children?: ReactNode }) {
  const bench = useLive();
  const { answer, current } = bench.asked;
  return (
    <>
      <LiveVerdict bench={bench} />
      <Row label="Evidence" className="live-evidence">
        <div className={answer && !current ? 'is-old' : undefined}>
          {answer?.kind === 'statement' && answer.body.parts.length > 0 && (
            <EvidenceFloor parts={answer.body.parts} onShow={nothingShown} />
          )}
        </div>
        {children}
      </Row>
    </>
  );
}

/** The way to the bench with what stands in the line, and other statements to try. */
export function LiveTry({ examples }: { readonly examples: readonly Draft[] }) {
  const { field, text, write } = useLive();
  return (
    <p className="acts live-try">
      <Link className="plain" href={benchAddress(field, text)}>
        Open on the bench
      </Link>
      <span className="quiet small">or try</span>
      {examples.map((example) => (
        <button
          type="button"
          className="plain path"
          key={`${example.field} ${example.statement}`}
          onClick={() => write(example)}
        >
          {example.statement}
        </button>
      ))}
    </p>
  );
}
