import { z } from 'zod';

/** A piece of mathematics as an answer shows it: text that can be typed back, and TeX to paste. */
export const typeset = z.object({
  text: z.string().describe('Plain text; the language reads it back as the same thing.'),
  tex: z.string().describe('TeX, for mathematics mode.'),
});
export type Typeset = z.infer<typeof typeset>;

/** A field as an answer names it. */
export const fieldAnswer = z.object({
  text: z.string().describe('The name, as it can be typed.'),
  tex: z.string().describe('The name in TeX.'),
  modulus: typeset
    .optional()
    .describe('For a finite field that is not a prime field: the polynomial whose root generates it over its base.'),
});
export type FieldAnswer = z.infer<typeof fieldAnswer>;

/** A group named in TeX, such as the Milnor–Witt group in which one part of a class lies. */
export const group = z.object({ tex: z.string().describe('The group in TeX.') });

/** The keys that every answer of a computation has. */
export const common = {
  engine: z.string().describe('Version of the engine that gave the answer.'),
  field: fieldAnswer,
};

export const sideConditions = z
  .array(typeset)
  .describe('What has to hold for the answer to be claimed: letters that must be units, hypotheses that were used.');

/** Request keys that several calls share. */
export const fieldName = z
  .string()
  .describe('The field: `Q`, `R`, `C`, `Q_5`, `F_9`, `F_3[z]/(z^2+1)`, `any` and so on; see the help page.');
export const expressionText = z.string().describe('An expression, at most 20 000 characters long.');
export const hypotheses = z
  .array(z.string())
  .max(50)
  .describe('Conditions under which the question is asked, such as `a != 1` or `char != 2`. At most 50.');
