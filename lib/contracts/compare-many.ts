import { z } from 'zod';
import { compareAnswer } from './compare';
import type { Contract } from './contract';
import { compareManyExamples } from './examples/compare-many';
import { problem } from './problem';

export const mostCompares = 500;

/** Each entry is validated by itself, so that one that is wrong does not take the others with it. */
export const compareManyRequest = z.strictObject({
  compares: z
    .array(z.unknown())
    .min(1)
    .max(mostCompares)
    .describe('Up to 500 questions, each as for `compare`.')
    .meta({ items: { $ref: '#/components/schemas/CompareRequest' } }),
});

export const compareManyItem = z.union([
  z.object({ status: z.literal(200), answer: compareAnswer }),
  z.object({ status: z.int().min(400).max(599), problem }),
]);
export type CompareManyItem = z.infer<typeof compareManyItem>;

export const compareManyAnswer = z.object({
  engine: z.string().describe('Version of the engine that gave the answers.'),
  answers: z.array(compareManyItem).describe('One for each question, in the same order, each with its own status.'),
});
export type CompareManyAnswer = z.infer<typeof compareManyAnswer>;

export const compareManyContract: Contract<typeof compareManyRequest, typeof compareManyAnswer> = {
  method: 'POST',
  path: '/api/v1/compare/many',
  operation: 'compareMany',
  summary: 'Up to 500 verdicts in one call',
  description:
    'Answers every question in order, each with its own status. The call counts as many times towards the quota as it has questions, and what is left when its time is over is answered with status 503.',
  permission: 'compute',
  request: compareManyRequest,
  answer: compareManyAnswer,
  problems: ['invalid', 'busy'],
  examples: compareManyExamples,
};
