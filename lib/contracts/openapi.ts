import { z } from 'zod';
import type { Contract } from './contract';

/** Version of the API that this document and these contracts describe. */
export const apiVersion = '1.0.0';

export const openApiAnswer = z.looseObject({
  openapi: z.string().describe('Version of the OpenAPI specification.'),
  info: z.looseObject({ title: z.string(), version: z.string() }),
  paths: z.record(z.string(), z.unknown()),
  components: z.record(z.string(), z.unknown()),
});

export const openApiContract: Contract<undefined, typeof openApiAnswer> = {
  method: 'GET',
  path: '/api/v1/openapi.json',
  operation: 'describe',
  summary: 'The description of the API, for programs',
  description: 'The OpenAPI 3.1 document of the API.',
  permission: 'service-state',
  request: undefined,
  answer: openApiAnswer,
  problems: [],
  examples: [],
};
