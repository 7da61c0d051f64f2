'use client';

import { useEffect, useMemo, useState } from 'react';
import { longLine, type Reading, readLine } from './reading';

/** How long the hand must rest before a long line is read, in milliseconds. */
const rest = 300;

/** Reads the line at each key; a long one when the hand rests, and until then the answer is `undefined`. */
export function useReading(text: string): Reading | undefined {
  const long = text.length > longLine;
  const atOnce = useMemo(() => (long ? undefined : readLine(text)), [text, long]);
  const [later, setLater] = useState<Reading>();
  useEffect(() => {
    if (!long) return;
    const timer = setTimeout(() => setLater(readLine(text)), rest);
    return () => clearTimeout(timer);
  }, [text, long]);
  return atOnce ?? (later?.text === text ? later : undefined);
}
