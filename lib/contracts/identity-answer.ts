import { z } from 'zod';
import { checkVerdicts, identityKinds, identityStates } from '@/models/identity-words';
import { compareAnswer } from './compare';
import { visibility } from './identity-content';
import { problem } from './problem';
import { residuesAnswer } from './residues';
import { typeset } from './typeset';

const moment = z.iso.datetime().describe('A moment, in UTC.');

export const checkVerdict = z
  .enum(checkVerdicts)
  .describe('`stopped`: the check ended at its time or size limit. `refused`: this engine does not decide it yet.');

export const checkSummary = z.object({
  verdict: checkVerdict,
  engine: z.string().describe('Version of the engine that checked.'),
  at: moment,
  durationMs: z.int().min(0),
  sentence: z.string().describe('What the check found, in words.'),
});
export type CheckSummary = z.infer<typeof checkSummary>;

/** What one revision says, set and as it can be typed back. */
const wording = {
  kind: z.enum(identityKinds),
  name: z.string(),
  field: typeset,
  statement: typeset.describe('As it was typed, without its hypotheses. Of a residue the class.'),
  hypotheses: z.array(typeset),
  place: typeset.optional(),
  uniformizer: typeset.optional(),
  value: typeset.optional(),
  warning: z.boolean().describe('Whether it says that the sides, or residue and value, are not the same.'),
  reference: z.string().optional(),
  doi: z.string().optional(),
  arxiv: z.string().optional(),
  tags: z.array(z.string()),
  remark: z.string().optional(),
  lastCheck: checkSummary.optional().describe('The last check of this revision.'),
};

export const identitySummary = z.object({
  key: z.string().describe('Short name of the group and number, such as `skerry-6`.'),
  number: z.int().min(1),
  group: z.object({ name: z.string(), slug: z.string() }),
  revision: z.int().min(1).describe('Number of the revision that is shown.'),
  state: z
    .enum(identityStates)
    .describe('`checked` when the last check of the current revision confirms what it says, else `draft`.'),
  visibility,
  ...wording,
  degrees: z.array(z.int()).describe('The degrees in which the statement was checked.'),
  keeper: z.string().describe('Who kept it.'),
  createdAt: moment,
  changedAt: moment,
  withdrawnReason: z.string().optional(),
});
export type IdentitySummary = z.infer<typeof identitySummary>;

export const revisionAnswer = z.object({
  number: z.int().min(1),
  author: z.string(),
  at: moment,
  change: z.string().optional().describe('What was changed, in the words of its author.'),
  ...wording,
});
export type RevisionAnswer = z.infer<typeof revisionAnswer>;

export const checkAnswer = z.object({ revision: z.int().min(1), ...checkSummary.shape });
export type CheckAnswer = z.infer<typeof checkAnswer>;

/** What is kept of a check: the answers of the engine, or why there is none. */
export const checkEvidence = z.object({
  sentence: z.string(),
  compare: compareAnswer.optional().describe('The comparison: of the sides, or of residue and value.'),
  residues: residuesAnswer.optional().describe('Of a residue: the residue that was computed.'),
  problem: problem.optional().describe('Why the check has no verdict.'),
});
export type CheckEvidence = z.infer<typeof checkEvidence>;

export const identityAnswer = z.object({
  ...identitySummary.shape,
  current: z.int().min(1).describe('Number of the current revision.'),
  revisions: z.array(revisionAnswer).describe('All revisions, the newest first.'),
  checks: z.array(checkAnswer).describe('The last checks of all revisions, at most 100, the newest first.'),
  evidence: checkEvidence.optional().describe('Of the last check of the revision that is shown.'),
});
export type IdentityAnswer = z.infer<typeof identityAnswer>;
