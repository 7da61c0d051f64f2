'use client';

import { useQuery } from '@tanstack/react-query';
import type { EvidenceAnswer } from '@/lib/contracts/compare';
import type { Typeset } from '@/lib/contracts/typeset';
import { Formula } from '../../math/formula';
import { Row } from '../../shell/row';
import { askForm } from '../ask';
import { quotientWords } from '../verdict-words';
import { wholeForm } from './whole-form';

/** A term longer than this is no help as a repair. */
const shortRepair = 60;

/** The canonical form of left minus right, once it is known. */
export function useDifference(field: string, left: Typeset | undefined, right: Typeset | undefined, wanted: boolean) {
  const expression = `(${left?.text ?? '0'}) - (${right?.text ?? '0'})`;
  const { data } = useQuery({
    queryKey: ['difference', field, expression],
    queryFn: ({ signal }) => askForm(field, expression, signal),
    enabled: wanted && left !== undefined && right !== undefined,
    retry: false,
    staleTime: Infinity,
    refetchOnWindowFocus: false,
  });
  if (!data || data.parts.length === 0) return undefined;
  const form = wholeForm(data.parts);
  return { ...form, repairs: form.text.length <= shortRepair };
}

interface Props {
  readonly field: string;
  readonly left: Typeset;
  readonly right: Typeset;
  readonly evidence: EvidenceAnswer;
}

/** Left minus right in canonical form, and what is left of it in the two quotients. */
export function Difference({ field, left, right, evidence }: Props) {
  const form = useDifference(field, left, right, true);
  const quotients = quotientWords(evidence.modEta, evidence.modH);
  return (
    <Row side="left minus right" sideClass="to-lead" id="minus">
      <p className="lead">{form ? <Formula tex={form.tex} breaks /> : '\u00a0'}</p>
      {quotients !== '' && <p className="text quiet mt-2">{quotients}</p>}
    </Row>
  );
}
