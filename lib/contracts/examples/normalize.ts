import type { Example } from '../contract';

/** Worked exchanges for `normalize`; a test holds them against the engine. */
export const normalizeExamples: readonly Example[] = [
  {
    name: 'word',
    summary: 'A word over ℚ, brought to canonical form degree by degree',
    request: {
      field: 'Q',
      expression: '[2][-1] + 3[5][7] - \\eta[6]',
    },
    answer: {
      engine: '1.0.0',
      field: {
        text: 'Q',
        tex: '\\mathbb{Q}',
      },
      expression: {
        text: '[2][-1] + 3[5][7] - eta[6]',
        tex: '[2][-1] + 3[5][7] - \\eta[6]',
      },
      parts: [
        {
          degree: 2,
          normalForm: {
            text: '[3][2] + [5][3] + [7][6]',
            tex: '[3][2] + [5][3] + [7][6]',
          },
          canonical: true,
          group: {
            tex: 'K^{\\mathrm{MW}}_{2}(\\mathbb{Q})',
          },
        },
        {
          degree: 0,
          normalForm: {
            text: 'eta[2] + eta[3]',
            tex: '\\eta[2] + \\eta[3]',
          },
          canonical: true,
          group: {
            tex: 'K^{\\mathrm{MW}}_{0}(\\mathbb{Q})',
          },
        },
      ],
      sideConditions: [],
    },
  },
  {
    name: 'finite',
    summary: 'Over 𝔽₉ the answer names the modulus whose root is z',
    request: {
      field: 'F_9',
      expression: '[z] + [z+1]',
    },
    answer: {
      engine: '1.0.0',
      field: {
        text: 'F_9',
        tex: '\\mathbb{F}_{9}',
        modulus: {
          text: 'z^2+1',
          tex: 'z^{2}+1',
        },
      },
      expression: {
        text: '[z] + [z+1]',
        tex: '[z] + [z+1]',
      },
      parts: [
        {
          degree: 1,
          normalForm: {
            text: '[z+2]',
            tex: '[z+2]',
          },
          canonical: true,
          group: {
            tex: 'K^{\\mathrm{MW}}_{1}(\\mathbb{F}_{9})',
          },
        },
      ],
      sideConditions: [],
    },
  },
];
