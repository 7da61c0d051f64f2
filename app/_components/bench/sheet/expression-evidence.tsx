'use client';

import { useQuery } from '@tanstack/react-query';
import { useCallback, useRef, useState } from 'react';
import { readFieldName } from '@/grammar/read';
import type { ComparedPart } from '@/lib/contracts/compare';
import type { NormalizeAnswer } from '@/lib/contracts/normalize';
import { Button } from '../../button/button';
import { useKey } from '../../keys/keys-provider';
import { Row } from '../../shell/row';
import { Floor, type FloorCell } from '../../tile/floor';
import { askInvariants, askResidues } from '../ask';
import { floorOfExpression } from '../floor-of-expression';
import { withRankAtReal } from '../real-place';
import { FormFacts } from './form-facts';
import { LongFormula } from './long-formula';
import { ResidueTable } from './residue-table';
import { StepTable } from './step-table';

const once = { retry: false, staleTime: Infinity, refetchOnWindowFocus: false } as const;

function InvariantsFloor({
  parts,
  answer,
}: {
  readonly parts: readonly ComparedPart[];
  readonly answer: NormalizeAnswer;
}) {
  const [chosen, setChosen] = useState<FloorCell>();
  const { places, rows } = floorOfExpression(withRankAtReal(parts));
  const formOf = (degree: number) => answer.parts.find((part) => part.degree === degree)?.normalForm;
  const states = new Set(rows.flatMap((row) => row.cells.map((cell) => cell?.state)));
  return (
    <>
      <Floor
        label="Values by degree and place"
        places={places}
        rows={rows.map((row) => {
          const form = formOf(row.degree);
          return { ...row, of: form && <LongFormula text={form.text} tex={form.tex} /> };
        })}
        heading={answer.parts.every(({ canonical }) => canonical) ? 'canonical form' : 'as a word'}
        onShow={setChosen}
      />
      <p className="legend">
        {states.has('solid') && <span>Filled: there is something there.</span>}
        {states.has('none') && <span>Faint: there is nothing.</span>}
      </p>
      {chosen && (
        <p className="text cell-said" role="status">
          {chosen.name}.
        </p>
      )}
    </>
  );
}

/** Whether residues at all places of the field are offered. */
function hasPlaces(field: string): boolean {
  const name = readFieldName(field);
  return name.kind === 'rationals' || name.kind === 'functions';
}

interface Props {
  readonly answer: NormalizeAnswer;
  /** The expression as it was typed. */
  readonly expression: string;
}

/** What there is to see of one class: its floor, its form in degree 0, its derivation, its residues. */
export function ExpressionEvidence({ answer, expression }: Props) {
  const field = answer.field.text;
  const placed = hasPlaces(field);
  const [open, setOpen] = useState(true);
  const why = useRef<HTMLDivElement>(null);
  const residueMatter = useRef<HTMLDivElement>(null);
  const invariants = useQuery({
    queryKey: ['invariants', field, expression],
    queryFn: ({ signal }) => askInvariants(field, expression, signal),
    ...once,
  });
  const residues = useQuery({
    queryKey: ['residues', field, expression],
    queryFn: ({ signal }) => askResidues(field, expression, signal),
    enabled: placed,
    ...once,
  });

  const toggle = useCallback(() => {
    setOpen(!open);
    if (!open) requestAnimationFrame(() => why.current?.scrollIntoView({ block: 'nearest' }));
  }, [open]);
  useKey({
    keyName: 'W',
    label: 'why: open or close the derivation',
    act: toggle,
    enabled: answer.steps !== undefined,
  });
  useKey({
    keyName: 'R',
    label: 'residues of this class',
    act: () => residueMatter.current?.scrollIntoView({ block: 'center' }),
    enabled: placed,
  });

  const seen = invariants.data?.parts.filter((part) => part.compared.length > 0) ?? [];
  const degreeZero = seen.find((part) => part.degree === 0);
  return (
    <>
      <Row label="Invariants">{seen.length > 0 && <InvariantsFloor parts={seen} answer={answer} />}</Row>
      {degreeZero && <FormFacts part={degreeZero} />}
      {answer.steps && (
        <Row side="why" sideClass="to-chain" id="why">
          <div ref={why}>
            {open && <StepTable steps={answer.steps} />}
            <Button kind="plain" keyName="W" tip="Why" aria-expanded={open} onClick={toggle}>
              {open
                ? 'Fold the derivation'
                : `Derivation, ${answer.steps.length} ${answer.steps.length === 1 ? 'step' : 'steps'}`}
            </Button>
          </div>
        </Row>
      )}
      {placed && (
        <Row side="residues" sideClass="to-table" id="residues">
          <div ref={residueMatter}>
            {residues.data ? (
              <ResidueTable answer={residues.data} />
            ) : (
              <p className="text quiet">{residues.error?.message}</p>
            )}
          </div>
        </Row>
      )}
    </>
  );
}
