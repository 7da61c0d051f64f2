import type { Example } from '../contract';

/** Worked exchanges for `compare/many`; a test holds them against the engine. */
export const compareManyExamples: readonly Example[] = [
  {
    name: 'two',
    summary: 'Two questions, one of which has no answer',
    request: {
      compares: [
        {
          field: 'F_7',
          statement: '[3][5] = 0',
        },
        {
          field: 'Q',
          left: '[0]',
          right: '1',
        },
      ],
    },
    answer: {
      engine: '1.0.0',
      answers: [
        {
          status: 200,
          answer: {
            engine: '1.0.0',
            field: {
              text: 'F_7',
              tex: '\\mathbb{F}_{7}',
            },
            statement: {
              text: '[3][5] = 0',
              tex: '[3][5] = 0',
            },
            sides: [
              {
                text: '[3][5]',
                tex: '[3][5]',
              },
              {
                text: '0',
                tex: '0',
              },
            ],
            verdict: 'equal',
            parts: [
              {
                degree: 2,
                verdict: 'equal',
                group: {
                  tex: 'K^{\\mathrm{MW}}_{2}(\\mathbb{F}_{7})',
                },
                compared: [
                  {
                    map: 'class',
                    same: true,
                    zero: true,
                    target: '0',
                    left: {
                      text: '0',
                      tex: '0',
                    },
                    right: {
                      text: '0',
                      tex: '0',
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
          },
        },
        {
          status: 422,
          problem: {
            type: '/help#error-not-a-unit',
            title: 'An entry of a symbol is zero',
            status: 422,
            detail: 'An entry of a symbol must be a unit, and 0 is none.',
            code: 'not-a-unit',
            part: 'left',
            line: 1,
            column: 2,
            excerpt: '[0]\n ^',
          },
        },
      ],
    },
  },
];
