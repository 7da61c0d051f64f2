'use client';

import { useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { CompareAnswer } from '@/lib/contracts/compare';
import type { ResidueAnswer } from '@/lib/contracts/residues';
import { askResidueAt, askSame, Declined } from '../../bench/ask';

const once = { retry: false, staleTime: Infinity, refetchOnWindowFocus: false } as const;
const rest = 300;

interface Asked {
  readonly field: string;
  readonly expression: string;
  readonly place: string;
  readonly uniformizer: string;
  readonly value: string;
}

function useRested(asked: Asked): Asked {
  const [rested, setRested] = useState(asked);
  const { field, expression, place, uniformizer, value } = asked;
  useEffect(() => {
    const timer = setTimeout(() => setRested({ field, expression, place, uniformizer, value }), rest);
    return () => clearTimeout(timer);
  }, [field, expression, place, uniformizer, value]);
  return rested;
}

export interface ResidueFound {
  /** The residue that was computed. */
  readonly residue?: ResidueAnswer;
  /** Its comparison with the value that is written. */
  readonly compared?: CompareAnswer;
  /** Why one of the two is not there. */
  readonly declined?: string;
  /** Whether all that belongs to what is written now. */
  readonly current: boolean;
}

/** Asks what the residue of a class is at a place, and whether it is the value that is written. */
export function useResidue(asked: Asked, wanted: boolean): ResidueFound {
  const rested = useRested(asked);
  const { field, expression, place, uniformizer, value } = rested;
  const complete = wanted && expression.trim() !== '' && place.trim() !== '';
  const computed = useQuery({
    queryKey: ['residue', field, expression, place, uniformizer],
    queryFn: ({ signal }) =>
      askResidueAt({ field, expression, place: place.trim(), uniformizer: uniformizer.trim() }, signal),
    enabled: complete,
    ...once,
  });
  const residue = computed.data?.residues[0];
  const compared = useQuery({
    queryKey: ['residue-value', residue?.residueField, residue?.value.text, value],
    queryFn: ({ signal }) => askSame(residue?.residueField ?? '', residue?.value.text ?? '0', value, signal),
    enabled: complete && residue !== undefined && value.trim() !== '',
    ...once,
  });
  if (!complete) return { current: false };
  const reason = computed.error ?? (residue && value.trim() !== '' ? compared.error : null);
  const same = (Object.keys(rested) as (keyof Asked)[]).every((key) => rested[key] === asked[key]);
  return {
    residue,
    compared: value.trim() === '' ? undefined : compared.data,
    declined: reason instanceof Declined ? reason.message : undefined,
    current: same && computed.fetchStatus === 'idle' && compared.fetchStatus === 'idle',
  };
}
