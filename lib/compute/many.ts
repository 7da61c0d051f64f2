import 'server-only';
import { engineVersion } from '@/engine/version';
import { config } from '@/lib/config/config';
import { compareRequest } from '@/lib/contracts/compare';
import type { CompareManyAnswer, CompareManyItem } from '@/lib/contracts/compare-many';
import { problemOf } from '@/lib/contracts/problem';
import { shapeProblem } from '@/lib/contracts/shape';
import { compute, poolSize } from './pool';
import { declined, isAnswer } from './request';

/**
 * Answers many questions in order, spread over the threads, each by itself. When the time of the whole call is over, those
 * that have no answer yet are declined; aborting `signal` throws its reason.
 */
export async function compareMany(questions: readonly unknown[], signal: AbortSignal): Promise<CompareManyAnswer> {
  const over = AbortSignal.timeout(config().COMPUTE_SECONDS_BATCH * 1000);
  const either = AbortSignal.any([over, signal]);
  const answers: CompareManyItem[] = [];
  let next = 0;
  const serve = async () => {
    for (let index = next++; index < questions.length; index = next++)
      answers[index] = over.aborted ? tooLate() : await one(questions[index], either, over);
  };
  await Promise.all(Array.from({ length: poolSize() }, serve));
  signal.throwIfAborted();
  return { engine: engineVersion, answers };
}

async function one(question: unknown, either: AbortSignal, over: AbortSignal): Promise<CompareManyItem> {
  const read = compareRequest.safeParse(question);
  if (!read.success) return declined(shapeProblem(read.error, question));
  try {
    const reply = await compute('compare', read.data, { signal: either, urgent: false });
    return isAnswer(reply) ? reply : declined(reply.problem);
  } catch (error) {
    if (over.aborted) return tooLate();
    throw error;
  }
}

const tooLate = (): CompareManyItem =>
  declined(
    problemOf(
      'budget',
      `The time of the whole call, ${config().COMPUTE_SECONDS_BATCH} seconds, was over before this question.`,
    ),
  );
