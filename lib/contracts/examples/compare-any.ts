import type { Example } from '../contract';

/** Worked exchanges for `compare` over an unspecified field; a test holds them against the engine. */
export const compareAnyExamples: readonly Example[] = [
  {
    name: 'counterexample',
    summary: 'A claim about every field, and values at which it fails',
    request: { field: 'any', statement: '[a][b] = [a+b][-ab]' },
    answer: {
      engine: '1.0.0',
      field: { text: 'any', tex: 'F' },
      statement: { text: '[a][b] = [a+b][-ab]', tex: '[a][b] = [a+b][-ab]' },
      sides: [
        { text: '[a][b]', tex: '[a][b]' },
        { text: '[a+b][-ab]', tex: '[a+b][-ab]' },
      ],
      verdict: 'different',
      parts: [
        {
          degree: 2,
          verdict: 'different',
          group: { tex: 'K^{\\mathrm{MW}}_{2}(F)' },
          compared: [
            {
              map: 'signature',
              place: 'real',
              same: true,
              zero: true,
              target: '\\mathbb{Z}',
              left: { text: '0', tex: '0' },
              right: { text: '0', tex: '0' },
            },
            {
              map: 'residue',
              place: '2',
              same: true,
              zero: true,
              target: '\\mathbb{F}_{2}^{\\times}',
              left: { text: '0', tex: '0' },
              right: { text: '0', tex: '0' },
            },
            {
              map: 'residue',
              place: '3',
              same: true,
              zero: false,
              target: '\\mathbb{F}_{3}^{\\times}',
              left: { text: '[2]', tex: '[2]' },
              right: { text: '[2]', tex: '[2]' },
            },
            {
              map: 'residue',
              place: '5',
              same: false,
              zero: false,
              target: '\\mathbb{F}_{5}^{\\times}',
              left: { text: '0', tex: '0' },
              right: { text: '[4]', tex: '[4]' },
            },
          ],
        },
      ],
      sideConditions: [
        { text: 'a != 0', tex: 'a \\ne 0' },
        { text: 'b != 0', tex: 'b \\ne 0' },
        { text: 'a+b != 0', tex: 'a+b \\ne 0' },
      ],
      evidence: {
        kind: 'counterexample',
        theorem:
          'A statement about every field and all values fails when it fails for one. Over Q rank, signature and the residues at all primes see every class (K_2: Tate, in J. Milnor, Introduction to Algebraic K-Theory, §11; W: J. Milnor, D. Husemoller, Symmetric Bilinear Forms, IV.2; together by the pull-back theorem, F. Morel, Comment. Math. Helv. 79, 2004).',
        modEta: false,
        modH: true,
        separating: {
          degree: 2,
          map: 'residue',
          place: '5',
          left: { text: '0', tex: '0' },
          right: { text: '[4]', tex: '[4]' },
          sentence:
            'It fails over Q with a = 3, b = 2. Different in degree 2, at 5. There the left side has residue 0 and the right side [4]. The two units differ modulo 5.',
        },
        counterexample: {
          field: { text: 'Q', tex: '\\mathbb{Q}' },
          values: [
            { letter: 'a', text: '3', tex: '3' },
            { letter: 'b', text: '2', tex: '2' },
          ],
          statement: { text: '[3][2] = [5][-6]', tex: '[3][2] = [5][-6]' },
        },
        tried: {
          limit: { steps: 20000, reached: false },
          fields: [
            { field: { text: 'F_2', tex: '\\mathbb{F}_{2}' }, values: 0 },
            { field: { text: 'F_3', tex: '\\mathbb{F}_{3}' }, values: 2 },
            { field: { text: 'F_4', tex: '\\mathbb{F}_{4}' }, values: 6 },
            { field: { text: 'F_5', tex: '\\mathbb{F}_{5}' }, values: 12 },
            { field: { text: 'F_7', tex: '\\mathbb{F}_{7}' }, values: 30 },
            { field: { text: 'F_8', tex: '\\mathbb{F}_{8}' }, values: 32 },
            { field: { text: 'F_9', tex: '\\mathbb{F}_{9}' }, values: 32 },
            { field: { text: 'F_11', tex: '\\mathbb{F}_{11}' }, values: 28 },
            { field: { text: 'F_13', tex: '\\mathbb{F}_{13}' }, values: 36 },
            { field: { text: 'Q', tex: '\\mathbb{Q}' }, values: 3 },
          ],
          proof: {
            limit: { steps: 30000, reached: false },
            generators: [
              { text: 'a', tex: 'a' },
              { text: 'b', tex: 'b' },
              { text: 'a+b', tex: 'a+b' },
            ],
            pairs: 0,
            relations: 0,
            chains: 6,
          },
        },
      },
    },
  },
  {
    name: 'proof',
    summary: 'An equality over every field, proved by a Steinberg relation',
    request: { field: 'any', left: '[a][b]', right: '[a+b][-b/a]' },
    answer: {
      engine: '1.0.0',
      field: { text: 'any', tex: 'F' },
      statement: { text: '[a][b] = [a+b][-b/a]', tex: '[a][b] = [a+b][-\\frac{b}{a}]' },
      sides: [
        { text: '[a][b]', tex: '[a][b]' },
        { text: '[a+b][-b/a]', tex: '[a+b][-\\frac{b}{a}]' },
      ],
      verdict: 'equal',
      parts: [
        {
          degree: 2,
          verdict: 'equal',
          group: { tex: 'K^{\\mathrm{MW}}_{2}(F)' },
          compared: [
            {
              map: 'residue',
              place: 'a',
              same: true,
              zero: false,
              target: 'K^{\\mathrm{MW}}_{1}(\\kappa)',
              left: { text: '[b]', tex: '[b]' },
              right: { text: '[b]', tex: '[b]' },
            },
            {
              map: 'residue',
              place: 'b',
              same: true,
              zero: false,
              target: 'K^{\\mathrm{MW}}_{1}(\\kappa)',
              left: { text: '-[a] - eta[-1][a]', tex: '-[a] - \\eta[-1][a]' },
              right: { text: '-[a] - eta[-1][a]', tex: '-[a] - \\eta[-1][a]' },
            },
            {
              map: 'residue',
              place: 'a+b',
              same: true,
              zero: true,
              target: 'K^{\\mathrm{MW}}_{1}(\\kappa)',
              left: { text: '0', tex: '0' },
              right: { text: '0', tex: '0' },
            },
          ],
        },
      ],
      sideConditions: [
        { text: 'a != 0', tex: 'a \\ne 0' },
        { text: 'b != 0', tex: 'b \\ne 0' },
        { text: 'a+b != 0', tex: 'a+b \\ne 0' },
      ],
      evidence: {
        kind: 'invariants',
        theorem:
          'The difference of the sides is an integer combination of multiples of Steinberg relations [x][y] = 0, x + y = 1 (F. Morel, A¹-Algebraic Topology over a Field, LNM 2052, Definition 3.1, number from memory), so it is zero over every field.',
        modEta: true,
        modH: true,
        relations: [
          {
            times: { text: '-1 - eta[a]', tex: '-1 - \\eta[a]' },
            left: { text: 'b/(a+b)', tex: '\\frac{b}{a+b}' },
            right: { text: 'a/(a+b)', tex: '\\frac{a}{a+b}' },
          },
        ],
        tried: {
          limit: { steps: 20000, reached: false },
          fields: [],
          proof: {
            limit: { steps: 30000, reached: false },
            generators: [
              { text: 'a', tex: 'a' },
              { text: 'b', tex: 'b' },
              { text: 'a+b', tex: 'a+b' },
            ],
            pairs: 1,
            relations: 6,
            chains: 5,
          },
        },
      },
    },
  },
  {
    name: 'undecided',
    summary: 'A claim about every field that both searches leave open',
    request: { field: 'any', left: 'eta[-1][a^4+3a^2b^2+b^4+2ab+1]', right: '0' },
    answer: {
      engine: '1.0.0',
      field: { text: 'any', tex: 'F' },
      statement: { text: 'eta[-1][a^4+3a^2b^2+b^4+2ab+1] = 0', tex: '\\eta[-1][a^{4}+3a^{2}b^{2}+b^{4}+2ab+1] = 0' },
      sides: [
        { text: 'eta[-1][a^4+3a^2b^2+b^4+2ab+1]', tex: '\\eta[-1][a^{4}+3a^{2}b^{2}+b^{4}+2ab+1]' },
        { text: '0', tex: '0' },
      ],
      verdict: 'undecided',
      parts: [{ degree: 1, verdict: 'undecided', group: { tex: 'K^{\\mathrm{MW}}_{1}(F)' }, compared: [] }],
      sideConditions: [{ text: 'a^4+3a^2b^2+b^4+2ab+1 != 0', tex: 'a^{4}+3a^{2}b^{2}+b^{4}+2ab+1 \\ne 0' }],
      evidence: {
        kind: 'invariants',
        theorem:
          'No lawful values at hand separate the sides, and no relations at hand join them. Values were looked for in small fields, so many in each and for at most 20000 steps; proofs among sums of products of the factors of the entries, for at most 30000 steps with each choice of factors.',
        modEta: true,
        tried: {
          limit: { steps: 20000, reached: true },
          fields: [
            { field: { text: 'F_2', tex: '\\mathbb{F}_{2}' }, values: 0 },
            { field: { text: 'F_3', tex: '\\mathbb{F}_{3}' }, values: 4 },
            { field: { text: 'F_4', tex: '\\mathbb{F}_{4}' }, values: 8 },
            { field: { text: 'F_5', tex: '\\mathbb{F}_{5}' }, values: 12 },
            { field: { text: 'F_7', tex: '\\mathbb{F}_{7}' }, values: 12 },
            { field: { text: 'F_8', tex: '\\mathbb{F}_{8}' }, values: 9 },
            { field: { text: 'F_9', tex: '\\mathbb{F}_{9}' }, values: 12 },
            { field: { text: 'F_11', tex: '\\mathbb{F}_{11}' }, values: 12 },
            { field: { text: 'F_13', tex: '\\mathbb{F}_{13}' }, values: 8 },
            { field: { text: 'Q', tex: '\\mathbb{Q}' }, values: 50 },
            { field: { text: 'any', tex: 'F' }, values: 0 },
            { field: { text: 'Q(t)', tex: '\\mathbb{Q}(t)' }, values: 24 },
            { field: { text: 'F_3(t)', tex: '\\mathbb{F}_{3}(t)' }, values: 35 },
            { field: { text: 'F_5(t)', tex: '\\mathbb{F}_{5}(t)' }, values: 36 },
          ],
          proof: {
            limit: { steps: 30000, reached: true },
            generators: [{ text: '1+2ab+a^4+3a^2b^2+b^4', tex: '1+2ab+a^{4}+3a^{2}b^{2}+b^{4}' }],
            pairs: 24,
            relations: 2500,
            chains: 1,
          },
        },
      },
    },
  },
];
