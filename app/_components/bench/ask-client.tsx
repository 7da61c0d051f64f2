'use client';

import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { type ReactNode, useState } from 'react';
import { type Answer, answerKey } from './ask';

interface Props {
  /** An answer that came with the page, so that its question need not be asked. */
  readonly known?: Answer;
  readonly children: ReactNode;
}

function clientKnowing(known: Answer | undefined): QueryClient {
  const client = new QueryClient();
  if (known) client.setQueryData(answerKey(known.question), known);
  return client;
}

/** Where questions and their answers are held while the page is open. */
export function AskClient({ known, children }: Props) {
  const [client] = useState(() => clientKnowing(known));
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}
