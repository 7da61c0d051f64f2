'use client';

import { useCallback, useDeferredValue, useEffect, useMemo, useRef, useState } from 'react';
import { conditionText, expressionText } from '@/engine/expression/to-text';
import type { Question } from './ask';
import { type Draft, rememberField } from './drafts';
import type { LineHandle } from './editor/line-editor';
import { faultOfDeclined, faultOfReading } from './fault';
import { useAnswer } from './use-answer';
import type { Reading } from './reading';
import { useReading } from './use-reading';

/** How long a line must stay unread before a note under it says why, so that the page does not move at each bracket that is opened. */
const patience = 350;

function useAfterRest(active: boolean, delay: number): boolean {
  const [rested, setRested] = useState(false);
  useEffect(() => {
    if (!active) return;
    const timer = setTimeout(() => setRested(true), delay);
    return () => {
      clearTimeout(timer);
      setRested(false);
    };
  }, [active, delay]);
  return active && rested;
}

/** What a line that can be read asks. An expression is asked apart from its hypotheses; a statement carries them. */
function questionOf(reading: Reading | undefined, field: string): Question | undefined {
  if (reading?.state !== 'read') return undefined;
  const question = { kind: reading.kind, field, text: reading.text.trimEnd() };
  const { sides, conditions } = reading.statement;
  const [only] = sides;
  if (reading.kind === 'statement' || conditions.length === 0 || !only) return question;
  return { ...question, under: { expression: expressionText(only), hypotheses: conditions.map(conditionText) } };
}

/** Everything that is known while one writes: the text, how it reads, what is wrong in it, and the last answer. */
export function useBench(opened: Draft | undefined) {
  const line = useRef<LineHandle>(null);
  const [field, setFieldState] = useState(opened?.field ?? 'Q');
  const [text, setText] = useState(opened?.statement ?? '');
  const [edited, setEdited] = useState(false);
  const [lastKey, setLastKey] = useState(0);

  const reading = useReading(text);
  const settled = useDeferredValue(reading);
  const question = useMemo(() => questionOf(reading, field), [reading, field]);
  const asked = useAnswer(question, lastKey);
  const fault = useMemo(
    () => faultOfReading(reading) ?? faultOfDeclined(asked.declined, text),
    [reading, asked.declined, text],
  );
  const noted = useAfterRest(fault !== undefined, patience);

  const touch = useCallback(() => {
    setEdited(true);
    setLastKey(performance.now());
  }, []);
  /** The editor reports what stands in it now. */
  const change = useCallback(
    (next: string) => {
      setText(next);
      touch();
    },
    [touch],
  );
  /** Puts another text into the line. */
  const put = useCallback((next: string) => line.current?.replace(next), []);
  const setField = useCallback(
    (next: string) => {
      setFieldState(next);
      touch();
      rememberField(next);
    },
    [touch],
  );
  const write = useCallback(
    (draft: Draft) => {
      setFieldState(draft.field);
      touch();
      put(draft.statement);
    },
    [touch, put],
  );

  const live = settled?.state === 'read' ? settled : undefined;
  return { line, field, setField, text, change, put, write, edited, reading, live, question, asked, fault, noted };
}

export type BenchState = ReturnType<typeof useBench>;
