import type { Metadata } from 'next';
import { currentCaller } from '@/lib/people/current';
import { Bench } from '../_components/bench/bench';
import { mayKeep } from '../_components/register/may-keep';
import { Colophon } from '../_components/shell/colophon';

export const metadata: Metadata = { title: 'Bench' };

interface Props {
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>;
}

const one = (value: string | string[] | undefined): string | undefined => (Array.isArray(value) ? value[0] : value);

/** The bench, bare or with what the address asks for: `/bench?field=Q&statement=[6]=[2]+[3]`. */
export default async function BenchPage({ searchParams }: Props) {
  const { field, statement } = await searchParams;
  const asked = one(statement);
  const over = one(field);
  const opened = asked === undefined && over === undefined ? undefined : { field: over ?? 'Q', statement: asked ?? '' };
  return (
    <>
      <Bench key={`${over ?? ''} ${asked ?? ''}`} opened={opened} mayKeep={mayKeep(await currentCaller())} />
      <Colophon />
    </>
  );
}
