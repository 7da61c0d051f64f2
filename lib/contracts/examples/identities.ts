import type { Example } from '../contract';

/** Worked exchanges for the register; a test holds the requests against the running service. */

const at = '2026-11-03T09:20:00.000Z';
const checked = {
  verdict: 'equal',
  engine: '1.0.0',
  at,
  durationMs: 24,
  sentence: 'The sides are equal, in degree 2.',
} as const;

const content = {
  name: 'Nothing in degree two',
  field: 'F_7',
  statement: '[3][5] = 0',
  reference: 'Seminar note 4, lemma 2',
  tags: ['finite-fields'],
};

const zero = { text: '0', tex: '0' };
const form = { ...zero, canonical: true };
const field = { text: 'F_7', tex: '\\mathbb{F}_{7}' };
const statement = { text: '[3][5] = 0', tex: '[3][5] = 0' };

const wording = { ...content, kind: 'equality', field, statement, hypotheses: [], warning: false, lastCheck: checked };

const summary = {
  key: 'skerry-6',
  number: 6,
  group: { name: 'Skerry seminar', slug: 'skerry' },
  revision: 1,
  state: 'checked',
  visibility: 'group',
  ...wording,
  degrees: [2],
  keeper: 'Tobias Renk',
  createdAt: at,
  changedAt: at,
};

const first = { number: 1, author: 'Tobias Renk', at, ...wording };

const compare = {
  engine: '1.0.0',
  field,
  statement,
  sides: [{ text: '[3][5]', tex: '[3][5]' }, zero],
  verdict: 'equal',
  parts: [
    {
      degree: 2,
      verdict: 'equal',
      group: { tex: 'K^{\\mathrm{MW}}_{2}(\\mathbb{F}_{7})' },
      compared: [{ map: 'class', same: true, zero: true, target: '0', left: zero, right: zero }],
      forms: { left: form, right: form },
    },
  ],
  sideConditions: [],
  evidence: {
    kind: 'invariants',
    theorem:
      'Over a finite field K^MW_n is 0 for n ≥ 2, the units for n = 1, and forms are classified by rank and discriminant (K_2 = 0: J. Milnor, Introduction to Algebraic K-Theory, §9; forms: T. Y. Lam, Introduction to Quadratic Forms over Fields, II.3; J. Milnor, D. Husemoller, Symmetric Bilinear Forms, for characteristic 2).',
    modEta: true,
    modH: true,
  },
};

const identity = {
  ...summary,
  current: 1,
  revisions: [first],
  checks: [{ revision: 1, ...checked }],
  evidence: { sentence: checked.sentence, compare },
};

const renamed = 'Nothing in degree two over seven elements';
const change = 'A longer name.';
const second = { ...first, number: 2, name: renamed, change };

const params = { key: 'skerry-6' };

export const createExamples: readonly Example[] = [
  { name: 'kept', summary: 'An equality over 𝔽₇', request: content, answer: identity },
];

export const listExamples: readonly Example[] = [
  {
    name: 'by-tag',
    summary: 'What has a tag, by name',
    query: { tag: 'finite-fields', sort: 'name', limit: '10' },
    answer: { identities: [summary], total: 1, states: { draft: 0, checked: 1, withdrawn: 0 } },
  },
];

export const readExamples: readonly Example[] = [
  { name: 'checked', summary: 'An identity that was checked', params, answer: identity },
];

export const reviseExamples: readonly Example[] = [
  {
    name: 'renamed',
    summary: 'Another name',
    params,
    request: { base: 1, change, ...content, name: renamed },
    answer: {
      ...identity,
      name: renamed,
      revision: 2,
      current: 2,
      revisions: [second, first],
      checks: [
        { revision: 2, ...checked },
        { revision: 1, ...checked },
      ],
    },
  },
];

export const withdrawExamples: readonly Example[] = [
  {
    name: 'withdrawn',
    summary: 'Withdrawn with a reason',
    params,
    request: { base: 1, reason: 'Said better in skerry-9.' },
    answer: { ...identity, state: 'withdrawn', withdrawnReason: 'Said better in skerry-9.' },
  },
];

export const showExamples: readonly Example[] = [
  {
    name: 'public',
    summary: 'For anyone who has the address',
    params,
    request: { visibility: 'public' },
    answer: { ...identity, visibility: 'public' },
  },
];

export const exportExamples: readonly Example[] = [
  {
    name: 'checked',
    summary: 'Everything that is checked, as JSON',
    query: { format: 'json', state: 'checked' },
    answer: { identities: [summary] },
  },
];
