import {
  OpenApiBuilder,
  type HeadersObject,
  type OpenAPIObject,
  type OperationObject,
  type ResponseObject,
} from 'openapi3-ts/oas31';
import type { AnyContract, Example } from '@/lib/contracts/contract';
import { apiVersion } from '@/lib/contracts/openapi';
import { type ProblemCode, problemKinds } from '@/lib/contracts/problem';
import { componentSchemas, nameOf, reference } from './components';
import { contracts } from './contracts';

/** Problems that any call can meet. */
const everyCall: readonly ProblemCode[] = ['method', 'internal'];
/** Problems that any call with a body can meet. */
const withBody: readonly ProblemCode[] = ['unreadable-json', 'too-large', 'content-type'];
/** Problems that any call which counts towards the quota can meet. */
const counted: readonly ProblemCode[] = ['quota', 'database'];

/** The OpenAPI 3.1 document, made from the contracts and nothing else. */
export function openApiDocument(): OpenAPIObject {
  const builder = OpenApiBuilder.create()
    .addOpenApiVersion('3.1.0')
    .addInfo({
      title: 'Quadrel',
      version: apiVersion,
      description:
        'Milnor–Witt K-theory over REST: canonical forms, decided equalities and residues. JSON in and out; what cannot be answered comes back as a problem document (RFC 9457). No account is needed below a quota for each address.',
    })
    .addServer({ url: '/' });
  for (const [name, schema] of Object.entries(componentSchemas())) builder.addSchema(name, schema);
  for (const contract of contracts)
    builder.addPath(contract.path, { [contract.method.toLowerCase()]: operation(contract) });
  return builder.getSpec();
}

function operation(contract: AnyContract): OperationObject {
  const { request } = contract;
  return {
    operationId: contract.operation,
    summary: contract.summary,
    description: contract.description,
    ...(request === undefined
      ? {}
      : {
          requestBody: {
            required: true,
            content: {
              'application/json': {
                schema: { $ref: reference(nameOf(request)) },
                examples: examples(contract.examples, 'request'),
              },
            },
          },
        }),
    responses: { '200': success(contract), ...declines(contract) },
  };
}

const success = (contract: AnyContract): ResponseObject => ({
  description: contract.summary,
  headers: { ...requestIdHeader, ...(isCounted(contract) ? quotaHeaders : {}) },
  content: {
    'application/json': {
      schema: { $ref: reference(nameOf(contract.answer)) },
      examples: examples(contract.examples, 'answer'),
    },
  },
});

const examples = (all: readonly Example[], side: 'request' | 'answer') =>
  Object.fromEntries(all.map((example) => [example.name, { summary: example.summary, value: example[side] }]));

const isCounted = (contract: AnyContract): boolean => contract.permission === 'compute';

/** One response for each status, its description listing every problem of that status. */
function declines(contract: AnyContract): Record<string, ResponseObject> {
  const codes = new Set<ProblemCode>([
    ...everyCall,
    ...(contract.request === undefined ? [] : withBody),
    ...(isCounted(contract) ? counted : []),
    ...contract.problems,
  ]);
  const byStatus: Record<string, ProblemCode[]> = {};
  for (const code of codes) (byStatus[problemKinds[code].status] ??= []).push(code);
  return Object.fromEntries(
    Object.entries(byStatus).map(([status, kinds]) => [
      status,
      {
        description: kinds.map((code) => `\`${code}\`: ${problemKinds[code].about}`).join('\n\n'),
        headers: { ...requestIdHeader, ...declineHeaders(status) },
        content: { 'application/problem+json': { schema: { $ref: reference('Problem') } } },
      },
    ]),
  );
}

const header = (description: string, type: 'string' | 'integer') => ({ description, schema: { type } }) as const;

const requestIdHeader = { 'X-Request-Id': header('Id of the request: the one sent, or a new one.', 'string') };

const quotaHeaders = {
  'RateLimit-Limit': header('Questions an address has in a minute; absent when there is no quota.', 'integer'),
  'RateLimit-Remaining': header('How many of them are left.', 'integer'),
  'RateLimit-Reset': header('Seconds until all of them are there again.', 'integer'),
};

function declineHeaders(status: string): HeadersObject {
  if (status === '405') return { Allow: header('The methods that answer.', 'string') };
  if (status === '429' || status === '503') return { 'Retry-After': header('Seconds to wait.', 'integer') };
  return {};
}
