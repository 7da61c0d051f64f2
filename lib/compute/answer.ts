import type { Budget } from '@/engine/arith/budget';
import { answerCompare } from './compare';
import { problemOfError } from './declined';
import { answerNormalize } from './normalize';
import { Reader } from './read';
import { type AnswerOf, type ComputeRequest, declined, type Kind, type Reply } from './request';
import { answerResidues } from './residues';

/**
 * Answers one question: plain data in, plain data out, and nothing else happens. What cannot be answered comes back as a
 * problem; texts that cannot be read come before fields that do not exist, and these before what is not decided.
 * Only a defect of the program throws.
 */
export function answer(request: ComputeRequest, budget: Budget): Reply<AnswerOf[Kind]> {
  const reader = new Reader();
  try {
    return { status: 200, answer: compute(request, reader, budget) };
  } catch (error) {
    const problem = problemOfError(error, reader.sources);
    if (problem === undefined) throw error;
    return declined(problem);
  }
}

function compute(request: ComputeRequest, reader: Reader, budget: Budget): AnswerOf[Kind] {
  switch (request.kind) {
    case 'normalize':
      return answerNormalize(request.body, reader, budget);
    case 'compare':
      return answerCompare(request.body, reader, budget);
    case 'residues':
      return answerResidues(request.body, reader, budget);
  }
}
