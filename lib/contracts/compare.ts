import { z } from 'zod';
import { type Contract, readingProblems } from './contract';
import { compareExamples } from './examples/compare';
import { common, expressionText, fieldName, group, hypotheses, sideConditions, typeset } from './typeset';

export const compareRequest = z
  .strictObject({
    field: fieldName,
    left: expressionText.optional(),
    right: expressionText.optional(),
    statement: z
      .string()
      .optional()
      .describe('Instead of `left` and `right`: `e = f`, or a chain `e = f = g`; hypotheses may follow after `;`.'),
    hypotheses: hypotheses.optional(),
    certificate: z
      .boolean()
      .optional()
      .describe('Ask for a certificate; the answer leaves it out when none is produced.'),
    forms: z
      .boolean()
      .optional()
      .describe('Ask for the canonical forms of both sides too; left out where the budget does not reach.'),
  })
  .refine(
    (body) =>
      body.statement === undefined
        ? body.left !== undefined && body.right !== undefined
        : body.left === undefined && body.right === undefined,
    { message: 'Give `left` and `right`, or `statement` alone.' },
  )
  .meta({ oneOf: [{ required: ['left', 'right'] }, { required: ['statement'] }] });
export type CompareRequest = z.infer<typeof compareRequest>;

export const verdict = z
  .enum(['equal', 'different', 'undecided'])
  .describe('`undecided` when neither an argument nor a separating invariant was found.');

export const mapName = z
  .enum([
    'rank',
    'signature',
    'residue',
    'specialisation',
    'product',
    'symbol',
    'discriminant',
    'hasse',
    'class',
    'word',
  ])
  .describe('The homomorphism that was applied to both sides.');

export const comparedMap = z.object({
  map: mapName,
  place: z.string().optional().describe('The place it belongs to: `real`, or a prime such as `7`.'),
  left: typeset,
  right: typeset,
  same: z.boolean().describe('Whether both sides take the same value.'),
  zero: z.boolean().describe('Whether both values are zero.'),
  target: z.string().describe('The group the values lie in, in TeX.'),
});
export type ComparedMap = z.infer<typeof comparedMap>;

const form = z.object({ ...typeset.shape, canonical: z.boolean() });

export const comparedPart = z.object({
  degree: z.int(),
  verdict,
  group: group.describe('The group that the parts of both sides lie in.'),
  compared: z.array(comparedMap),
  forms: z
    .object({ left: form, right: form })
    .optional()
    .describe('The canonical forms of both sides in this degree, when asked for and within the budget.'),
});
export type ComparedPart = z.infer<typeof comparedPart>;

export const counterexample = z.object({
  field: typeset.describe('A field one can type.'),
  values: z
    .array(z.object({ letter: z.string(), ...typeset.shape }))
    .describe('The letters that got a value; those left out stand for themselves.'),
  statement: typeset.describe('The statement with these values, to be asked over the field.'),
});
export type CounterexampleAnswer = z.infer<typeof counterexample>;

const searchLimit = z.object({
  steps: z.int().min(0).describe('How many steps the search may take.'),
  reached: z.boolean().describe('Whether it ended because of that, or of a limit on size.'),
});

export const tried = z.object({
  fields: z
    .array(z.object({ field: typeset, values: z.int().min(0) }))
    .describe('The fields in which letters got values, and how many lawful ones did not separate the sides.'),
  limit: searchLimit.describe('The budget of the search for such values.'),
  proof: z
    .object({
      limit: searchLimit.describe('The budget of the search for a proof, with one choice of units in one degree.'),
      generators: z.array(typeset).describe('The units of which all entries are products.'),
      pairs: z.int().min(0).describe('How many Steinberg pairs x + y = 1 there are among their products.'),
      relations: z.int().min(0).describe('How many multiples of Steinberg relations were combined.'),
      chains: z.int().min(0).describe('How many chains of residues and specialisations were followed to their ends.'),
    })
    .optional()
    .describe('Left out where no proof was looked for, since the sides were compared completely.'),
});
export type TriedAnswer = z.infer<typeof tried>;

export const evidence = z.object({
  kind: z.enum(['invariants', 'certificate', 'counterexample']),
  separating: z
    .object({
      degree: z.int(),
      map: mapName,
      place: z.string().optional(),
      left: typeset,
      right: typeset,
      sentence: z.string().describe('The difference in words.'),
    })
    .optional()
    .describe('The first invariant that takes two values; only when the sides differ.'),
  theorem: z.string().describe('Why the compared maps see everything: the theorem and its source.'),
  modEta: z
    .boolean()
    .optional()
    .describe('Equal modulo η, that is in Milnor K-theory; left out where it is not known.'),
  modH: z.boolean().optional().describe('Equal modulo h, that is in the Witt ring; left out where it is not known.'),
  counterexample: counterexample
    .optional()
    .describe(
      'Over `any`: a field and values at which the statement fails. What is compared, and `separating` with both values, then belongs to that field.',
    ),
  relations: z
    .array(z.object({ times: typeset, left: typeset, right: typeset }))
    .optional()
    .describe(
      'Over `any`: Steinberg relations, left + right = 1. In canonical words the difference of the sides is the sum of all times·[left][right].',
    ),
  tried: tried.optional().describe('Over `any`: how far the searches for a proof and for a counterexample went.'),
});
export type EvidenceAnswer = z.infer<typeof evidence>;

export const chainStep = z.object({
  left: typeset,
  right: typeset,
  verdict,
  parts: z.array(comparedPart),
  evidence,
});
export type ChainStep = z.infer<typeof chainStep>;

export const compareAnswer = z.object({
  ...common,
  statement: typeset.describe('The statement as it was understood.'),
  sides: z.array(typeset).describe('Its sides, in order.'),
  verdict: verdict.describe('Of a chain: different if one step is, else undecided if one is, else equal.'),
  parts: z
    .array(comparedPart)
    .describe('Degree by degree, highest first. Of a chain: of the first step that is not equal, else of the first.'),
  sideConditions,
  evidence: evidence.describe('Of a chain: of the same step as `parts`.'),
  chain: z.array(chainStep).optional().describe('Every step, for a chain of more than one.'),
  firstWrong: z.int().min(0).optional().describe('Index in `chain` of the first step that is different.'),
});
export type CompareAnswer = z.infer<typeof compareAnswer>;

export const compareContract: Contract<typeof compareRequest, typeof compareAnswer> = {
  method: 'POST',
  path: '/api/v1/compare',
  operation: 'compare',
  summary: 'Verdict on an equality, with evidence',
  description:
    'Decides whether two expressions are the same class over a field, by homomorphisms that together see everything, and lists what was compared. A chain is judged step by step.',
  permission: 'compute',
  request: compareRequest,
  answer: compareAnswer,
  problems: [...readingProblems, 'hypothesis'],
  examples: compareExamples,
};
