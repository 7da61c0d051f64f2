import type { Example } from '../contract';

/** Worked exchanges for `residues`; a test holds them against the engine. */
export const residuesExamples: readonly Example[] = [
  {
    name: 'ramified',
    summary: 'Every place where a class over ℚ ramifies',
    request: {
      field: 'Q',
      expression: '[7][5]',
    },
    answer: {
      engine: '1.0.0',
      field: {
        text: 'Q',
        tex: '\\mathbb{Q}',
      },
      expression: {
        text: '[7][5]',
        tex: '[7][5]',
      },
      residues: [
        {
          place: '5',
          residueField: 'F_5',
          residueFieldTex: '\\mathbb{F}_{5}',
          uniformizer: '5',
          uniformizerTex: '5',
          value: {
            text: '[3]',
            tex: '[3]',
          },
          degree: 1,
          zero: false,
          specialisation: {
            text: '0',
            tex: '0',
          },
        },
        {
          place: '7',
          residueField: 'F_7',
          residueFieldTex: '\\mathbb{F}_{7}',
          uniformizer: '7',
          uniformizerTex: '7',
          value: {
            text: '[5]',
            tex: '[5]',
          },
          degree: 1,
          zero: false,
          specialisation: {
            text: '0',
            tex: '0',
          },
        },
      ],
      unramifiedElsewhere: true,
    },
  },
  {
    name: 'uniformizer',
    summary: 'One place, with a uniformizer of one’s own',
    request: {
      field: 'Q',
      expression: '[7][5]',
      places: ['7'],
      uniformizer: '21',
    },
    answer: {
      engine: '1.0.0',
      field: {
        text: 'Q',
        tex: '\\mathbb{Q}',
      },
      expression: {
        text: '[7][5]',
        tex: '[7][5]',
      },
      residues: [
        {
          place: '7',
          residueField: 'F_7',
          residueFieldTex: '\\mathbb{F}_{7}',
          uniformizer: '21',
          uniformizerTex: '21',
          value: {
            text: '[5]',
            tex: '[5]',
          },
          degree: 1,
          zero: false,
          specialisation: {
            text: '0',
            tex: '0',
          },
        },
      ],
      unramifiedElsewhere: false,
    },
  },
];
