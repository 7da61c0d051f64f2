import { answer } from './answer';
import { cpuBudget } from './cpu-budget';
import type { AnswerOf, ComputeRequest, Kind, Reply } from './request';
import { markStart, type StartMark } from './wall';

/** One question with the seconds of processor time it may take. */
export interface Task {
  readonly request: ComputeRequest;
  readonly seconds: number;
  readonly started: StartMark;
}

/** What a worker thread does: answer one question after the other. */
export default function work({ request, seconds, started }: Task): Reply<AnswerOf[Kind]> {
  markStart(started);
  return answer(request, cpuBudget(seconds));
}
