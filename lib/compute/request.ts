import type { CompareAnswer, CompareRequest } from '@/lib/contracts/compare';
import type { NormalizeAnswer, NormalizeRequest } from '@/lib/contracts/normalize';
import type { Problem } from '@/lib/contracts/problem';
import type { ResiduesAnswer, ResiduesRequest } from '@/lib/contracts/residues';

/** The kinds of question and what each is made of. */
export interface BodyOf {
  readonly normalize: NormalizeRequest;
  readonly compare: CompareRequest;
  readonly residues: ResiduesRequest;
}

export interface AnswerOf {
  readonly normalize: NormalizeAnswer;
  readonly compare: CompareAnswer;
  readonly residues: ResiduesAnswer;
}

export type Kind = keyof BodyOf;

/** One question to the engine, as plain data: it may cross a thread. */
export type ComputeRequest = { [K in Kind]: { readonly kind: K; readonly body: BodyOf[K] } }[Kind];

/** What comes back: the answer, or why there is none. */
export type Reply<Answer> =
  { readonly status: 200; readonly answer: Answer } | { readonly status: Problem['status']; readonly problem: Problem };

/** Whether a reply is an answer. */
export const isAnswer = <Answer>(reply: Reply<Answer>): reply is { readonly status: 200; readonly answer: Answer } =>
  'answer' in reply;

/** A reply that declines. */
export const declined = (problem: Problem): { readonly status: number; readonly problem: Problem } => ({
  status: problem.status,
  problem,
});
