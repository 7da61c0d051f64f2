import { z } from 'zod';
import { type Contract, readingProblems } from './contract';
import { residuesExamples } from './examples/residues';
import { common, expressionText, fieldName, typeset } from './typeset';

export const residuesRequest = z
  .strictObject({
    field: fieldName,
    expression: expressionText,
    places: z
      .array(z.string())
      .max(100)
      .optional()
      .describe('Places to compute at, such as `"7"`; without it every place where the class ramifies.'),
    uniformizer: z.string().optional().describe('A uniformizer at the one place that is named.'),
  })
  .refine((body) => body.uniformizer === undefined || body.places?.length === 1, {
    message: 'A uniformizer goes with exactly one place: give `places` with one entry.',
    path: ['uniformizer'],
  });
export type ResiduesRequest = z.infer<typeof residuesRequest>;

export const residueAnswer = z.object({
  place: z.string(),
  residueField: z.string().describe('A field that can be typed.'),
  residueFieldTex: z.string(),
  uniformizer: z.string().describe('The uniformizer that was used, as text.'),
  uniformizerTex: z.string(),
  value: typeset.describe('The residue.'),
  degree: z
    .int()
    .describe('Degree of the highest non-zero part of the residue, or of the class less one when the residue is zero.'),
  zero: z.boolean(),
  specialisation: typeset,
});
export type ResidueAnswer = z.infer<typeof residueAnswer>;

export const residuesAnswer = z.object({
  ...common,
  expression: typeset.describe('The expression as it was understood.'),
  residues: z.array(residueAnswer),
  unramifiedElsewhere: z.boolean().describe('Whether the residue is zero at every place not listed.'),
});
export type ResiduesAnswer = z.infer<typeof residuesAnswer>;

export const residuesContract: Contract<typeof residuesRequest, typeof residuesAnswer> = {
  method: 'POST',
  path: '/api/v1/residues',
  operation: 'residues',
  summary: 'Residues and specialisations of a class',
  description:
    'Computes the residue of a class at the named places, or at every place where it ramifies, with the specialisation for the same uniformizer.',
  permission: 'compute',
  request: residuesRequest,
  answer: residuesAnswer,
  problems: [...readingProblems, 'place', 'uniformizer'],
  examples: residuesExamples,
};
