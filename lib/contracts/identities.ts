import { z } from 'zod';
import { type Contract, readingProblems } from './contract';
import {
  createExamples,
  exportExamples,
  listExamples,
  readExamples,
  reviseExamples,
  showExamples,
  withdrawExamples,
} from './examples/identities';
import { identityAnswer, identitySummary } from './identity-answer';
import { identityContent, identityRevision, limits, visibility } from './identity-content';
import { identityKey } from './identity-key';
import { exportQuery, identityList, identityQuery } from './identity-query';
import { lines } from './plain-text';

const byKey = z.strictObject({ key: identityKey });

/** What checking a statement can meet; what the engine does not decide, or not in time, is kept as a draft and is none. */
const checking = [
  ...readingProblems.filter((code) => code !== 'not-yet' && code !== 'size' && code !== 'budget'),
  'hypothesis',
  'place',
  'uniformizer',
] as const;
const keeping = [...checking, 'sides-differ', 'sides-agree'] as const;
const changing = ['not-found', 'conflict'] as const;

const base = z.int().min(1).describe('The number of the revision one has seen.');

export const withdrawRequest = z.strictObject({
  base,
  reason: lines(limits.reason).describe('Why nobody should rely on it, for whoever finds it later.'),
});
export type WithdrawRequest = z.infer<typeof withdrawRequest>;

export const visibilityRequest = z.strictObject({ visibility });

/** The register as JSON. */
export const exportAnswer = z.object({ identities: z.array(identitySummary) });

export const readQuery = z.strictObject({
  revision: z
    .string()
    .regex(/^[1-9]\d{0,8}$/, 'This is the number of a revision.')
    .transform(Number)
    .meta({ type: 'integer', minimum: 1, description: 'The revision to show; without it the current one.' })
    .optional(),
});

export const listIdentitiesContract: Contract<undefined, typeof identityList, undefined, typeof identityQuery> = {
  method: 'GET',
  path: '/api/v1/identities',
  operation: 'listIdentities',
  summary: 'The register of the group',
  description:
    'The identities of the group, filtered and sorted, page by page. A cursor stays good while others are added: nothing is listed twice and nothing is left out.',
  permission: 'register-read',
  request: undefined,
  query: identityQuery,
  answer: identityList,
  problems: ['invalid', 'syntax'],
  examples: listExamples,
};

export const createIdentityContract: Contract<typeof identityContent, typeof identityAnswer> = {
  method: 'POST',
  path: '/api/v1/identities',
  operation: 'keepIdentity',
  summary: 'Keep an identity',
  description:
    'Reads the statement, checks it and keeps it in the register of the group. What is equal is kept as `checked`; what the engine does not decide, or not in time, as `draft`. What is different is kept as a warning only. With an `Idempotency-Key` the same request makes one identity, however often it is sent within a day.',
  permission: 'identity-write',
  request: identityContent,
  answer: identityAnswer,
  success: 201,
  idempotent: true,
  problems: [...keeping, 'idempotency-key'],
  examples: createExamples,
};

export const readIdentityContract: Contract<undefined, typeof identityAnswer, typeof byKey, typeof readQuery> = {
  method: 'GET',
  path: '/api/v1/identities/{key}',
  operation: 'readIdentity',
  summary: 'One identity',
  description:
    'An identity of the group, or a public one, with its revisions, its checks and the evidence of the last check. A public one needs no token.',
  permission: 'identity-open',
  request: undefined,
  params: byKey,
  query: readQuery,
  answer: identityAnswer,
  problems: ['not-found', 'invalid'],
  examples: readExamples,
};

export const reviseIdentityContract: Contract<typeof identityRevision, typeof identityAnswer, typeof byKey> = {
  method: 'POST',
  path: '/api/v1/identities/{key}/revisions',
  operation: 'reviseIdentity',
  summary: 'Revise an identity',
  description:
    'Makes a new revision, checked like a new identity. Earlier revisions stay as they are. When another revision was made since `base`, the answer is a conflict with the current identity, and nothing is changed.',
  permission: 'identity-write',
  request: identityRevision,
  params: byKey,
  answer: identityAnswer,
  success: 201,
  problems: [...keeping, ...changing],
  examples: reviseExamples,
};

export const withdrawIdentityContract: Contract<typeof withdrawRequest, typeof identityAnswer, typeof byKey> = {
  method: 'POST',
  path: '/api/v1/identities/{key}/withdraw',
  operation: 'withdrawIdentity',
  summary: 'Withdraw an identity',
  description:
    'Marks an identity as one that nobody should rely on, with the reason. It stays in the register, and a revision brings it back.',
  permission: 'identity-write',
  request: withdrawRequest,
  params: byKey,
  answer: identityAnswer,
  problems: ['invalid', ...changing],
  examples: withdrawExamples,
};

export const checkIdentityContract: Contract<undefined, typeof identityAnswer, typeof byKey> = {
  method: 'POST',
  path: '/api/v1/identities/{key}/check',
  operation: 'checkIdentity',
  summary: 'Check an identity again',
  description:
    'Checks the current revision with the engine of today. The check is added to its history, and the state follows it.',
  permission: 'identity-write',
  request: undefined,
  params: byKey,
  answer: identityAnswer,
  problems: [...checking, 'not-found'],
  examples: readExamples,
};

export const showIdentityContract: Contract<typeof visibilityRequest, typeof identityAnswer, typeof byKey> = {
  method: 'POST',
  path: '/api/v1/identities/{key}/visibility',
  operation: 'showIdentity',
  summary: 'Show an identity to the group or to anyone',
  description: 'A public identity can be read by anyone who has the address of its page, without an account.',
  permission: 'identity-write',
  request: visibilityRequest,
  params: byKey,
  answer: identityAnswer,
  problems: ['invalid', 'not-found'],
  examples: showExamples,
};

export const exportIdentitiesContract: Contract<undefined, typeof exportAnswer, undefined, typeof exportQuery> = {
  method: 'GET',
  path: '/api/v1/identities/export',
  operation: 'exportIdentities',
  summary: 'Write the register out',
  description:
    'All identities under the given filters, by number, as one file: JSON, CSV (RFC 4180; a cell that a spreadsheet would take for a formula has an apostrophe before it), TeX or BibTeX.',
  permission: 'register-read',
  request: undefined,
  query: exportQuery,
  answer: exportAnswer,
  files: { csv: 'text/csv', tex: 'application/x-tex', bibtex: 'application/x-bibtex' },
  problems: ['invalid', 'syntax'],
  examples: exportExamples,
};
