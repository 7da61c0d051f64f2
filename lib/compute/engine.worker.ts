import { answer } from './answer';
import { cpuBudget } from './cpu-budget';
import type { AnswerOf, ComputeRequest, Kind, Reply } from './request';

/** One question with the seconds of processor time it may take. */
export interface Task {
  readonly request: ComputeRequest;
  readonly seconds: number;
}

/** What a worker thread does: answer one question after the other. */
export default function work({ request, seconds }: Task): Reply<AnswerOf[Kind]> {
  return answer(request, cpuBudget(seconds));
}
