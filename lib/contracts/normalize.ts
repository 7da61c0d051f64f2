import { z } from 'zod';
import { type Contract, readingProblems } from './contract';
import { normalizeExamples } from './examples/normalize';
import { common, expressionText, fieldName, group, hypotheses, sideConditions, typeset } from './typeset';

export const normalizeRequest = z.strictObject({
  field: fieldName,
  expression: expressionText,
  hypotheses: hypotheses.optional(),
  steps: z.boolean().optional().describe('Ask for the derivation of the canonical word, relation by relation.'),
});
export type NormalizeRequest = z.infer<typeof normalizeRequest>;

export const normalizedPart = z.object({
  degree: z.int(),
  normalForm: typeset,
  canonical: z
    .boolean()
    .describe('Promise: two elements of this field are equal in this degree iff these texts are equal.'),
  group: group.describe('The group the part lies in.'),
});
export type NormalizedPart = z.infer<typeof normalizedPart>;

export const derivationStep = z.object({
  relation: z.string().describe('The relation that was used.'),
  args: z.array(z.string()).describe('The field elements it was used at, as texts.'),
  before: typeset,
  after: typeset,
});
export type DerivationStep = z.infer<typeof derivationStep>;

export const normalizeAnswer = z.object({
  ...common,
  expression: typeset.describe('The expression as it was understood.'),
  parts: z.array(normalizedPart).describe('By degree, highest first; empty for the zero class.'),
  sideConditions,
  steps: z.array(derivationStep).optional().describe('Only when asked for.'),
});
export type NormalizeAnswer = z.infer<typeof normalizeAnswer>;

export const normalizeContract: Contract<typeof normalizeRequest, typeof normalizeAnswer> = {
  method: 'POST',
  path: '/api/v1/normalize',
  operation: 'normalize',
  summary: 'Canonical form of an expression',
  description:
    'Brings an expression in symbols [a] and η to canonical form over a field, degree by degree. An equation is refused here: ask `compare` about it.',
  permission: 'compute',
  request: normalizeRequest,
  answer: normalizeAnswer,
  problems: [...readingProblems, 'hypothesis'],
  examples: normalizeExamples,
};
