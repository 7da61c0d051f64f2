'use client';

import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useRef, useState } from 'react';
import { type Answer, answerKey, ask, Declined, type Question, sameQuestion } from './ask';

/** The hand must rest this long before a question is asked, in milliseconds. */
const debounce = 250;
/** Work that takes longer than this is shown, in milliseconds. */
export const unseenWork = 400;

export interface Asked {
  /** The last answer there is, current or old. */
  readonly answer: Answer | undefined;
  /** Whether that answer belongs to what is asked now. */
  readonly current: boolean;
  /** A question has gone out, or will when the hand rests. */
  readonly waiting: boolean;
  /** A question is out. */
  readonly working: boolean;
  /** The work has taken so long that it is shown. */
  readonly slow: boolean;
  readonly offline: boolean;
  readonly stopped: boolean;
  readonly declined: Declined | undefined;
  /** From the last key to the answer, in milliseconds. */
  readonly took: number | undefined;
  stop(): void;
  /** Asks without waiting for the hand to rest, and again if the last time was stopped or declined. */
  askNow(): void;
}

const nothing = ['answer'] as const;

/** Asks the service a question that changes as one types: the one before is cancelled, the last answer is kept. */
export function useAnswer(question: Question | undefined, lastKey: number): Asked {
  const client = useQueryClient();
  const [rested, setRested] = useState(question);
  const [stoppedAt, setStoppedAt] = useState<Question>();
  const [last, setLast] = useState<Answer>();
  const [slowFor, setSlowFor] = useState<Question>();
  const [took, setTook] = useState<{ readonly of: Answer; readonly ms: number }>();

  useEffect(() => {
    if (!question || sameQuestion(rested, question)) return;
    const timer = setTimeout(() => setRested(question), debounce);
    return () => clearTimeout(timer);
  }, [question, rested]);

  const stopped = question !== undefined && sameQuestion(stoppedAt, question);
  const active = question && sameQuestion(rested, question) && !stopped ? question : undefined;
  const query = useQuery({
    queryKey: active ? answerKey(active) : nothing,
    queryFn: ({ signal }) => {
      if (!active) throw new Declined('Nothing is asked.');
      return ask(active, signal);
    },
    enabled: active !== undefined,
    retry: false,
    staleTime: Infinity,
    refetchOnWindowFocus: false,
  });
  const { data, error, fetchStatus, refetch } = query;

  if (active && data && data !== last) setLast(data);
  const current = last !== undefined && sameQuestion(last.question, question);
  const declined = active && error instanceof Declined && fetchStatus === 'idle' ? error : undefined;
  const working = active !== undefined && fetchStatus === 'fetching';

  useEffect(() => {
    if (!working || !active) return;
    const timer = setTimeout(() => setSlowFor(active), unseenWork);
    return () => clearTimeout(timer);
  }, [working, active]);

  const key = useRef(lastKey);
  useEffect(() => {
    key.current = lastKey;
  }, [lastKey]);
  useEffect(() => {
    if (current && last && key.current > 0 && took?.of !== last)
      setTook({ of: last, ms: Math.max(0, performance.now() - key.current) });
  }, [current, last, took]);

  useEffect(() => {
    if (!declined?.again) return;
    const timer = setTimeout(() => void refetch(), declined.again * 1000);
    return () => clearTimeout(timer);
  }, [declined, refetch]);

  const stop = useCallback(() => {
    setStoppedAt(question);
    void client.cancelQueries({ queryKey: nothing });
  }, [client, question]);

  const askNow = useCallback(() => {
    setStoppedAt(undefined);
    setRested(question);
    if (declined) void refetch();
  }, [question, declined, refetch]);

  return {
    answer: last,
    current,
    waiting: question !== undefined && !current && !declined && !stopped,
    working,
    slow: working && sameQuestion(slowFor, active),
    offline: active !== undefined && fetchStatus === 'paused',
    stopped,
    declined,
    took: current && took?.of === last ? took.ms : undefined,
    stop,
    askNow,
  };
}
