'use client';

import { useRouter } from 'next/navigation';
import { createContext, useContext } from 'react';
import { makeLink } from '@/app/bench/actions';
import { Button } from '../button/button';
import { useKey } from '../keys/keys-provider';
import type { Question } from './ask';

/** Whether whoever is at the bench may keep identities, or may become someone who may by signing in. */
export const MayKeep = createContext(false);

/** An address longer than this is not carried everywhere; past it the statement travels under a code. */
const longestAddress = 1500;

/** Where a statement is kept as an identity: by itself in the address, or by a code when it is long. */
async function keepAddress({ field, text }: Question, kind: 'equality' | 'residue'): Promise<string | undefined> {
  const more: Record<string, string> = kind === 'residue' ? { kind } : {};
  const address = `/register/keep?${new URLSearchParams({ ...more, field, statement: text }).toString()}`;
  if (address.length <= longestAddress) return address;
  const path = await makeLink(field, text);
  const code = path?.split('/').at(-1);
  return code && `/register/keep?${new URLSearchParams({ ...more, code }).toString()}`;
}

/** Goes to where a question is kept; undefined for whoever may not. */
export function useKeep(question: Question | undefined, kind: 'equality' | 'residue' = 'equality') {
  const router = useRouter();
  const may = useContext(MayKeep);
  if (!may || !question) return undefined;
  return () =>
    void keepAddress(question, kind).then((address) => {
      if (address !== undefined) router.push(address as Parameters<typeof router.push>[0]);
    });
}

interface Props {
  readonly question: Question | undefined;
  /** What is found so far; without it the statement is not decided. */
  readonly verdict?: 'equal' | 'different' | 'undecided';
  readonly current: boolean;
}

const words = {
  equal: 'Keep as identity',
  different: 'Keep as a warning',
  undecided: 'Keep as a draft',
} as const;

/** Keeps the statement in the register: as an identity, as a warning that the sides are not the same, or as a draft. */
export function KeepButton({ question, verdict = 'undecided', current }: Props) {
  const keep = useKeep(question);
  const word = words[verdict];
  useKey({
    keyName: 'K',
    label: word.charAt(0).toLowerCase() + word.slice(1),
    act: () => keep?.(),
    enabled: keep !== undefined && current,
  });
  if (!keep) return null;
  const unavailable = current ? undefined : 'Only a current answer can be kept';
  return (
    <Button
      kind={verdict === 'equal' ? 'primary' : verdict === 'different' ? 'plain' : 'outlined'}
      wide={verdict !== 'different'}
      keyName="K"
      tip={word}
      tipSide={verdict === 'different' ? 'right' : 'left'}
      unavailable={unavailable}
      onClick={keep}
    >
      {word}
    </Button>
  );
}
