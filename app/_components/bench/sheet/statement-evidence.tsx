'use client';

import Link from 'next/link';
import { useCallback, useRef, useState } from 'react';
import type { CompareAnswer } from '@/lib/contracts/compare';
import { Button } from '../../button/button';
import { useKey } from '../../keys/keys-provider';
import { Formula } from '../../math/formula';
import { Row } from '../../shell/row';
import type { FloorCell } from '../../tile/floor';
import { benchAddress } from '../bench-address';
import { valuesTex } from '../values-tex';
import { ApartTable } from './apart-table';
import { ChainTable } from './chain-table';
import { Difference } from './difference';
import { EvidenceFloor } from './evidence-floor';
import { OpenRows, RelationRows } from './proof-rows';
import { TriedStrip } from './tried-strip';

/** A statement longer than this is not asked about once more for its difference. */
const shortEnough = 2000;

/** What a verdict rests on: the chain, the fields that were tried, the floor of tiles, left and right apart, left minus right. */
export function StatementEvidence({ answer }: { readonly answer: CompareAnswer }) {
  const chain = answer.chain && answer.chain.length > 1 ? answer.chain : undefined;
  const begin = chain ? Math.max(0, answer.firstWrong ?? chain.findIndex((step) => step.verdict !== 'equal')) : 0;
  const [step, setStep] = useState(begin);
  const [open, setOpen] = useState<boolean>();
  const [chosen, setChosen] = useState<FloorCell>();
  const apart = useRef<HTMLDivElement>(null);

  const judged = chain?.[step];
  const parts = judged?.parts ?? answer.parts;
  const verdict = judged?.verdict ?? answer.verdict;
  const left = judged?.left ?? answer.sides[0];
  const right = judged?.right ?? answer.sides[1];
  const { counterexample, relations, tried } = (judged ?? answer).evidence;
  const compared = parts.some((part) => part.compared.length > 0);
  const shown = open ?? verdict !== 'equal';

  const toggle = useCallback(() => {
    setOpen(!shown);
    if (!shown) requestAnimationFrame(() => apart.current?.scrollIntoView({ block: 'nearest' }));
  }, [shown]);
  useKey({ keyName: 'W', label: 'why: left and right apart', act: toggle });
  const showCell = useCallback((cell: FloorCell | undefined) => {
    setChosen(cell);
    if (cell) setOpen(true);
  }, []);

  return (
    <>
      {chain && (
        <Row side="steps" sideClass="to-chain" id="steps">
          <ChainTable chain={chain} firstWrong={answer.firstWrong} shown={step} onShow={setStep} />
        </Row>
      )}
      {tried && <TriedStrip tried={tried} counterexample={counterexample} />}
      {verdict === 'undecided' && tried && <OpenRows tried={tried} />}
      {(compared || parts.length === 0 || chain) && (
        <Row label={chain ? `Evidence for step ${step + 1}` : 'Evidence'}>
          {chain && (
            <p className="text quiet floor-of">
              Step {step + 1} of {chain.length}:
            </p>
          )}
          {counterexample && (
            <p className="lead floor-of">
              {counterexample.values.length > 0 && (
                <>
                  At <Formula tex={valuesTex(counterexample.values)} />:{' '}
                </>
              )}
              <Link href={benchAddress(counterexample.field.text, counterexample.statement.text)}>
                <Formula tex={counterexample.statement.tex} /> over <Formula tex={counterexample.field.tex} />
              </Link>
            </p>
          )}
          {parts.length === 0 && <p className="text quiet">Both sides are zero in every degree.</p>}
          {compared && (
            <EvidenceFloor parts={parts} onShow={showCell}>
              {verdict === 'equal' && (
                <Button
                  kind="plain"
                  keyName="W"
                  tip="Why"
                  aria-expanded={shown}
                  className="legend-act"
                  onClick={toggle}
                >
                  Left and right apart
                </Button>
              )}
            </EvidenceFloor>
          )}
          {chosen && (
            <p className="text cell-said" role="status">
              {chosen.name}.
            </p>
          )}
        </Row>
      )}
      {relations && relations.length > 0 && <RelationRows relations={relations} />}
      {shown && compared && (
        <Row side="left and right apart" sideClass="to-table" id="apart">
          <div ref={apart}>
            <ApartTable parts={parts} chosen={chosen?.key} />
          </div>
        </Row>
      )}
      {verdict === 'different' &&
        !counterexample &&
        left &&
        right &&
        left.text.length + right.text.length <= shortEnough && (
          <Difference field={answer.field.text} left={left} right={right} evidence={(judged ?? answer).evidence} />
        )}
    </>
  );
}
