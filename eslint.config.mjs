import coreWebVitals from 'eslint-config-next/core-web-vitals';
import nextTypescript from 'eslint-config-next/typescript';
import { pureRooms } from './tests/harness/arrows.mjs';
import { arrows } from './tests/harness/arrows-rule.mjs';

const inexact = [
  'random',
  'sqrt',
  'cbrt',
  'log',
  'log2',
  'log10',
  'log1p',
  'exp',
  'pow',
  'floor',
  'ceil',
  'round',
  'trunc',
  'hypot',
];
const inexactMessage = 'Nothing here may be decided by floating point or by chance.';

const config = [
  { ignores: ['.next/**', '.quadrel/**', 'dist/**', 'next-env.d.ts', 'public/**'] },
  ...coreWebVitals,
  ...nextTypescript,
  {
    plugins: { quadrel: { rules: { arrows } } },
    linterOptions: { reportUnusedDisableDirectives: 'error' },
    rules: {
      'quadrel/arrows': 'error',
      eqeqeq: 'error',
      'prefer-const': 'error',
      'no-var': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', caughtErrors: 'all', ignoreRestSiblings: true },
      ],
      '@typescript-eslint/consistent-type-imports': ['error', { disallowTypeAnnotations: false }],
    },
  },
  {
    files: pureRooms.map((room) => `${room}/**`),
    ignores: ['grammar/write-source.ts'], // a command for people who change the grammar
    rules: {
      'no-restricted-globals': [
        'error',
        { name: 'Date', message: 'The engine reads no clock.' },
        { name: 'performance', message: 'The engine reads no clock.' },
        { name: 'process', message: 'The engine also runs in the browser.' },
        { name: 'Buffer', message: 'The engine also runs in the browser.' },
        { name: 'window', message: 'The engine also runs in Node.' },
        { name: 'document', message: 'The engine also runs in Node.' },
        { name: 'parseFloat', message: inexactMessage },
      ],
      'no-restricted-properties': [
        'error',
        ...inexact.map((property) => ({ object: 'Math', property, message: inexactMessage })),
        { property: 'toFixed', message: inexactMessage },
        { object: 'Number', property: 'parseFloat', message: inexactMessage },
      ],
    },
  },
];

export default config;
