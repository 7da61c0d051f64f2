import { z } from 'zod';
import { checkVerdicts, identityStates } from '@/models/identity-words';
import { identitySummary } from './identity-answer';
import { tag } from './identity-content';
import { oneLine } from './plain-text';

/** What the register can be sorted by; a hyphen before it turns the order round. */
export const sorts = ['changed', '-changed', 'name', '-name', 'number', '-number', 'state', '-state'] as const;
export type Sort = (typeof sorts)[number];

export const exportFormats = ['csv', 'json', 'tex', 'bibtex'] as const;
export type ExportFormat = (typeof exportFormats)[number];

/** A whole number, written in the query string. */
const whole = (least: number, most: number, about: string) =>
  z
    .string()
    .refine((text) => /^-?\d{1,6}$/.test(text) && Number(text) >= least && Number(text) <= most, {
      error: `This is a whole number from ${least} to ${most}.`,
    })
    .transform(Number)
    .meta({ type: 'integer', minimum: least, maximum: most, description: about });

const filters = {
  words: z
    .string()
    .max(200)
    .optional()
    .describe('Words, or their beginnings, all of which occur in the name, the statement, the reference and so on.'),
  state: z.enum(identityStates).optional(),
  field: z.string().max(500).optional().describe('A field, such as `Q(t)`.'),
  degree: whole(-100_000, 100_000, 'A degree in which the statement was checked.').optional(),
  verdict: z.enum(checkVerdicts).optional().describe('What the last check of the current revision found.'),
  tag: tag.optional(),
  keeper: oneLine(200).optional().describe('The name of the one who kept it.'),
};

export const identityFilters = z.strictObject(filters);
export type IdentityFilters = z.infer<typeof identityFilters>;

export const identityQuery = z.strictObject({
  ...filters,
  sort: z.enum(sorts).default('-changed').describe('What to sort by; with a hyphen the other way round.'),
  limit: whole(1, 100, 'How many at once.').default(25),
  cursor: z
    .string()
    .max(600)
    .optional()
    .describe('`next` of the answer before, for what follows; same filters, same sort.'),
});
export type IdentityQuery = z.infer<typeof identityQuery>;

export const exportQuery = z.strictObject({ format: z.enum(exportFormats).default('json'), ...filters });
export type ExportQuery = z.infer<typeof exportQuery>;

const count = z.int().min(0);

export const identityList = z.object({
  identities: z.array(identitySummary),
  total: count.describe('How many there are under these filters.'),
  states: z
    .object({ draft: count, checked: count, withdrawn: count })
    .describe('How many there are in each state, under the other filters.'),
  next: z.string().optional().describe('Cursor of what follows; absent when this is the end.'),
});
export type IdentityList = z.infer<typeof identityList>;
