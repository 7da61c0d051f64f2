import { z } from 'zod';

/** The longest texts a form keeps; what is sent is checked more narrowly when it is kept as an identity. */
const longText = z.string().max(60_000);
const text = z.string().max(4_000);

/** What stands in the form for an identity while it is being written: every field as it was typed. */
export const identityForm = z.strictObject({
  kind: z.enum(['equality', 'residue']),
  field: text,
  statement: longText,
  place: text,
  uniformizer: text,
  value: longText,
  warning: z.boolean(),
  name: text,
  reference: text,
  doi: text,
  arxiv: text,
  tags: text,
  remark: longText,
  visibility: z.enum(['group', 'public']),
  change: text,
});
export type IdentityForm = z.infer<typeof identityForm>;

/** A form that was begun; `base` is the revision it began from. */
export const identityDraft = z.strictObject({ form: identityForm, base: z.int().min(1).optional() });
export type IdentityDraft = z.infer<typeof identityDraft>;

/** Where a draft belongs: the form that keeps a new identity, or the one that revises a certain one. */
export const draftKey = z.string().regex(/^(keep|revise:[a-z][a-z0-9-]{0,80}-[1-9][0-9]{0,8})$/);
