import type { Example } from '../contract';
import { compareAnyExamples } from './compare-any';

/** Worked exchanges for `compare`; a test holds them against the engine. */
export const compareExamples: readonly Example[] = [
  {
    name: 'different',
    summary: 'Two classes that differ by η[2][3]',
    request: {
      field: 'Q',
      left: '[6]',
      right: '[2] + [3]',
    },
    answer: {
      engine: '1.0.0',
      field: {
        text: 'Q',
        tex: '\\mathbb{Q}',
      },
      statement: {
        text: '[6] = [2] + [3]',
        tex: '[6] = [2] + [3]',
      },
      sides: [
        {
          text: '[6]',
          tex: '[6]',
        },
        {
          text: '[2] + [3]',
          tex: '[2] + [3]',
        },
      ],
      verdict: 'different',
      parts: [
        {
          degree: 1,
          verdict: 'different',
          group: {
            tex: 'K^{\\mathrm{MW}}_{1}(\\mathbb{Q})',
          },
          compared: [
            {
              map: 'signature',
              place: 'real',
              same: true,
              zero: true,
              target: '\\mathbb{Z}',
              left: {
                text: '0',
                tex: '0',
              },
              right: {
                text: '0',
                tex: '0',
              },
            },
            {
              map: 'residue',
              place: '2',
              same: true,
              zero: false,
              target: '\\mathrm{GW}(\\mathbb{F}_{2})',
              left: {
                text: '1',
                tex: '1',
              },
              right: {
                text: '1',
                tex: '1',
              },
            },
            {
              map: 'residue',
              place: '3',
              same: false,
              zero: false,
              target: '\\mathrm{GW}(\\mathbb{F}_{3})',
              left: {
                text: '<2>',
                tex: '\\langle 2\\rangle',
              },
              right: {
                text: '1',
                tex: '1',
              },
            },
          ],
        },
      ],
      sideConditions: [],
      evidence: {
        kind: 'invariants',
        theorem:
          'Over Q rank, signature and the residues at all primes see every class (K_2: Tate, in J. Milnor, Introduction to Algebraic K-Theory, §11; W: J. Milnor, D. Husemoller, Symmetric Bilinear Forms, IV.2; together by the pull-back theorem, F. Morel, Comment. Math. Helv. 79, 2004).',
        modEta: true,
        modH: false,
        separating: {
          degree: 1,
          map: 'residue',
          place: '3',
          left: {
            text: '<2>',
            tex: '\\langle 2\\rangle',
          },
          right: {
            text: '1',
            tex: '1',
          },
          sentence:
            'Different in degree 1, at 3. There the left side has residue <2> and the right side 1. Both have rank 1, but their discriminants differ by a non-square modulo 3.',
        },
      },
    },
  },
  {
    name: 'chain',
    summary: 'A chain of equalities over 𝔽₇',
    request: {
      field: 'F_7',
      statement: '[6] = [2] + [3] + \\eta[2][3] = [-1]',
    },
    answer: {
      engine: '1.0.0',
      field: {
        text: 'F_7',
        tex: '\\mathbb{F}_{7}',
      },
      statement: {
        text: '[6] = [2] + [3] + eta[2][3] = [-1]',
        tex: '[6] = [2] + [3] + \\eta[2][3] = [-1]',
      },
      sides: [
        {
          text: '[6]',
          tex: '[6]',
        },
        {
          text: '[2] + [3] + eta[2][3]',
          tex: '[2] + [3] + \\eta[2][3]',
        },
        {
          text: '[-1]',
          tex: '[-1]',
        },
      ],
      verdict: 'equal',
      parts: [
        {
          degree: 1,
          verdict: 'equal',
          group: {
            tex: 'K^{\\mathrm{MW}}_{1}(\\mathbb{F}_{7})',
          },
          compared: [
            {
              map: 'class',
              same: true,
              zero: false,
              target: '\\mathbb{F}_{7}^{\\times}',
              left: {
                text: '[6]',
                tex: '[6]',
              },
              right: {
                text: '[6]',
                tex: '[6]',
              },
            },
          ],
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
      chain: [
        {
          left: {
            text: '[6]',
            tex: '[6]',
          },
          right: {
            text: '[2] + [3] + eta[2][3]',
            tex: '[2] + [3] + \\eta[2][3]',
          },
          verdict: 'equal',
          parts: [
            {
              degree: 1,
              verdict: 'equal',
              group: {
                tex: 'K^{\\mathrm{MW}}_{1}(\\mathbb{F}_{7})',
              },
              compared: [
                {
                  map: 'class',
                  same: true,
                  zero: false,
                  target: '\\mathbb{F}_{7}^{\\times}',
                  left: {
                    text: '[6]',
                    tex: '[6]',
                  },
                  right: {
                    text: '[6]',
                    tex: '[6]',
                  },
                },
              ],
            },
          ],
          evidence: {
            kind: 'invariants',
            theorem:
              'Over a finite field K^MW_n is 0 for n ≥ 2, the units for n = 1, and forms are classified by rank and discriminant (K_2 = 0: J. Milnor, Introduction to Algebraic K-Theory, §9; forms: T. Y. Lam, Introduction to Quadratic Forms over Fields, II.3; J. Milnor, D. Husemoller, Symmetric Bilinear Forms, for characteristic 2).',
            modEta: true,
            modH: true,
          },
        },
        {
          left: {
            text: '[2] + [3] + eta[2][3]',
            tex: '[2] + [3] + \\eta[2][3]',
          },
          right: {
            text: '[-1]',
            tex: '[-1]',
          },
          verdict: 'equal',
          parts: [
            {
              degree: 1,
              verdict: 'equal',
              group: {
                tex: 'K^{\\mathrm{MW}}_{1}(\\mathbb{F}_{7})',
              },
              compared: [
                {
                  map: 'class',
                  same: true,
                  zero: false,
                  target: '\\mathbb{F}_{7}^{\\times}',
                  left: {
                    text: '[6]',
                    tex: '[6]',
                  },
                  right: {
                    text: '[6]',
                    tex: '[6]',
                  },
                },
              ],
            },
          ],
          evidence: {
            kind: 'invariants',
            theorem:
              'Over a finite field K^MW_n is 0 for n ≥ 2, the units for n = 1, and forms are classified by rank and discriminant (K_2 = 0: J. Milnor, Introduction to Algebraic K-Theory, §9; forms: T. Y. Lam, Introduction to Quadratic Forms over Fields, II.3; J. Milnor, D. Husemoller, Symmetric Bilinear Forms, for characteristic 2).',
            modEta: true,
            modH: true,
          },
        },
      ],
    },
  },
  ...compareAnyExamples,
];
