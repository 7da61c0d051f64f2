import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { openLink } from '@/lib/links/links';
import { currentCaller } from '@/lib/people/current';
import { Bench } from '../../_components/bench/bench';
import { mayKeep } from '../../_components/register/may-keep';
import { Colophon } from '../../_components/shell/colophon';

export const metadata: Metadata = { title: 'Bench' };

interface Props {
  readonly params: Promise<{ code: string }>;
}

/** The bench as it was when its link was copied. */
export default async function LinkedBenchPage({ params }: Props) {
  const { code } = await params;
  const opened = await openLink(code);
  if (!opened) notFound();
  return (
    <>
      <Bench key={code} opened={opened} mayKeep={mayKeep(await currentCaller())} />
      <Colophon />
    </>
  );
}
