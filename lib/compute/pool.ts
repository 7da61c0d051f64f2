import 'server-only';
import { availableParallelism } from 'node:os';
import path from 'node:path';
import Piscina from 'piscina';
import { config } from '@/lib/config/config';
import { problemOf } from '@/lib/contracts/problem';
import type { Task } from './engine.worker';
import { laneSizes, longestQueues, quickSeconds } from './lanes';
import { type AnswerOf, type BodyOf, type ComputeRequest, declined, type Kind, type Reply } from './request';
import { Busy, Slots } from './slots';
import { threadLimits } from './thread-limits';
import { newStartMark, wallAround } from './wall';

export interface Asking {
  /** Ends the computation when the client goes away or the whole call is over. */
  readonly signal?: AbortSignal;
  /** False for one of many: those wait behind the questions that stand alone. */
  readonly urgent?: boolean;
}

type AnyReply = Reply<AnswerOf[Kind]>;

interface Engine {
  readonly threads: Piscina<Task, AnyReply>;
  readonly quick: Slots;
  readonly slow: Slots;
  /** Questions that are attempted at the same time. */
  readonly size: number;
}

// Routes are bundled apart and each would load this module for itself; the process must still have one set of threads.
const held = globalThis as typeof globalThis & { quadrelEngine?: Engine };

function engine(): Engine {
  held.quadrelEngine ??= start();
  return held.quadrelEngine;
}

function start(): Engine {
  const { COMPUTE_THREADS, COMPUTE_MEMORY_MIB } = config();
  const sizes = laneSizes(COMPUTE_THREADS > 0 ? COMPUTE_THREADS : Math.max(2, availableParallelism()));
  const queues = longestQueues(sizes);
  const threads: Engine['threads'] = new Piscina({
    filename: path.join(/* turbopackIgnore: true */ process.cwd(), 'dist', 'engine.worker.mjs'),
    minThreads: sizes.quick + sizes.slow,
    maxThreads: sizes.quick + sizes.slow,
    concurrentTasksPerWorker: 1,
    resourceLimits: threadLimits(COMPUTE_MEMORY_MIB),
    // Nothing of the environment, such as the address of the database, reaches the threads.
    env: {},
  });
  // An idle thread that fails is replaced; the failure of a task reaches its caller.
  threads.on('error', () => undefined);
  return {
    threads,
    quick: new Slots(sizes.quick, queues.quick),
    slow: new Slots(sizes.slow, queues.slow),
    size: sizes.quick,
  };
}

/** How many questions are attempted at the same time. */
export const poolSize = (): number => engine().size;

/** Starts the threads, so that the first question need not wait for them. */
export function warmPool(): void {
  engine();
}

/**
 * Answers one question in a worker thread, within the interactive budget. A thread that does not stop in time is ended and
 * replaced. Aborting the signal ends the thread too and throws the signal's reason.
 */
export async function compute<K extends Kind>(
  kind: K,
  body: BodyOf[K],
  asking: Asking = {},
): Promise<Reply<AnswerOf[K]>> {
  // Kind and body belong together by the signature; a union of pairs cannot be built from a type parameter without saying so.
  const request = { kind, body } as unknown as ComputeRequest;
  const seconds = config().COMPUTE_SECONDS_INTERACTIVE;
  const { quick, slow } = engine();
  try {
    const first = await attempt({ request, seconds: Math.min(quickSeconds, seconds) }, quick, asking);
    const done = seconds <= quickSeconds || !('problem' in first) || first.problem.code !== 'budget';
    const reply = done ? first : await attempt({ request, seconds }, slow, asking);
    // The reply to a question of one kind is of that kind; what crosses a thread cannot carry that in its type.
    return reply as Reply<AnswerOf[K]>;
  } catch (error) {
    if (error instanceof Busy) return declined(problemOf('busy', 'Too many questions are waiting. Ask again shortly.'));
    throw error;
  }
}

const attempt = (task: Omit<Task, 'started'>, lane: Slots, { signal, urgent = true }: Asking): Promise<AnyReply> =>
  lane.run(
    async () => {
      const started = newStartMark();
      const wall = wallAround(task.seconds, started);
      const either = signal === undefined ? wall.signal : AbortSignal.any([wall.signal, signal]);
      try {
        return await engine().threads.run({ ...task, started }, { signal: either });
      } catch (error) {
        signal?.throwIfAborted();
        if (wall.signal.aborted)
          return declined(problemOf('budget', `Stopped: the computation did not end in time. ${smaller}`));
        if (isOutOfMemory(error)) return declined(problemOf('size', `Stopped at the limit on memory. ${smaller}`));
        throw error;
      } finally {
        wall.clear();
      }
    },
    { urgent, signal },
  );

const smaller = 'Ask about something smaller.';

const isOutOfMemory = (error: unknown): boolean =>
  error instanceof Error && 'code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY';
