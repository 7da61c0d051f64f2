import { z } from 'zod';
import type { Contract } from './contract';

export const healthAnswer = z.object({
  status: z.literal('ok'),
  database: z.literal('ok'),
  version: z.string().describe('Version of the program.'),
});
export type HealthAnswer = z.infer<typeof healthAnswer>;

export const healthContract: Contract<undefined, typeof healthAnswer> = {
  method: 'GET',
  path: '/api/v1/health',
  operation: 'health',
  summary: 'Whether the service and its database answer',
  description: 'Answers 200 while the database answers, else 503.',
  permission: 'service-state',
  request: undefined,
  answer: healthAnswer,
  problems: ['database'],
  examples: [
    { name: 'well', summary: 'Everything answers', answer: { status: 'ok', database: 'ok', version: '0.1.0' } },
  ],
};
