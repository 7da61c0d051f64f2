import { z } from 'zod';
import { identityKinds, visibilities } from '@/models/identity-words';
import { lines, oneLine } from './plain-text';
import { arxiv, doi } from './references';

/** How much each text of an identity may have, in characters, and how many entries a list. */
export const limits = {
  name: 120,
  field: 500,
  statement: 20_000,
  hypothesis: 500,
  hypotheses: 50,
  reference: 500,
  remark: 4000,
  tags: 12,
  change: 300,
  reason: 500,
} as const;

export const tag = z
  .string()
  .max(200)
  .trim()
  .toLowerCase()
  .refine((text) => /^[a-z0-9][a-z0-9-]{0,39}$/.test(text), {
    error: 'A tag has at most 40 letters a to z, digits and hyphens, and no hyphen first.',
  });

/** What a revision says, key by key. */
const content = {
  name: oneLine(limits.name).describe('What the group calls it.'),
  kind: z
    .enum(identityKinds)
    .default('equality')
    .describe('`equality`: the sides of the statement are the same. `residue`: the residue of a class is the value.'),
  field: oneLine(limits.field).describe('The field, as for the computations: `Q`, `F_9`, `Q(t)`, `any` and so on.'),
  statement: lines(limits.statement).describe(
    'Of an equality `e = f` or a chain `e = f = g`, hypotheses may follow after `;`. Of a residue the class.',
  ),
  hypotheses: z
    .array(oneLine(limits.hypothesis))
    .max(limits.hypotheses)
    .default([])
    .describe('Conditions under which an equality is claimed, such as `a != 1`.'),
  place: oneLine(limits.field).optional().describe('Of a residue: the place, such as `7`.'),
  uniformizer: oneLine(limits.field).optional().describe('Of a residue: the uniformizer, if not the usual one.'),
  value: lines(limits.statement).optional().describe('Of a residue: what it is claimed to be, over the residue field.'),
  warning: z.boolean().default(false).describe('Says instead that the sides, or residue and value, are not the same.'),
  reference: oneLine(limits.reference).optional().describe('Where it comes from, in words.'),
  doi: doi.optional(),
  arxiv: arxiv.optional(),
  tags: z
    .array(tag)
    .max(limits.tags)
    .overwrite((tags) => [...new Set(tags)])
    .default([]),
  remark: lines(limits.remark).optional(),
};

export const visibility = z
  .enum(visibilities)
  .describe('Who can see it: the group, or anyone who has the address of its page.');

type Checked = {
  kind: 'equality' | 'residue';
  hypotheses: string[];
  place?: string;
  uniformizer?: string;
  value?: string;
};

/** A residue needs its place and its value; an equality has no use for them. */
function fitsKind(given: Checked, context: z.core.$RefinementCtx<Checked>): void {
  const complain = (key: keyof Checked, message: string) =>
    context.addIssue({ code: 'custom', message, path: [key], input: given });
  if (given.kind === 'residue') {
    if (given.place === undefined) complain('place', 'A residue needs the place at which it is taken.');
    if (given.value === undefined) complain('value', 'A residue needs the value it is claimed to have.');
    if (given.hypotheses.length > 0) complain('hypotheses', 'Hypotheses go with an equality, not with a residue.');
    return;
  }
  for (const key of ['place', 'uniformizer', 'value'] as const)
    if (given[key] !== undefined) complain(key, `An equality has no ${key}; that goes with a residue.`);
}

/** A new identity. */
export const identityContent = z
  .strictObject({ ...content, visibility: visibility.default('group') })
  .superRefine(fitsKind);
export type IdentityContent = z.infer<typeof identityContent>;

/** A new revision of one that is there, with the number of the revision it was begun from. */
export const identityRevision = z
  .strictObject({
    base: z.int().min(1).describe('The number of the revision that this one was begun from.'),
    change: oneLine(limits.change).optional().describe('What was changed and why, in a line.'),
    ...content,
  })
  .superRefine(fitsKind);
export type IdentityRevision = z.infer<typeof identityRevision>;

/** What a revision says, without what is about the identity or about the change. */
export type RevisionContent = Omit<IdentityContent, 'visibility'>;
