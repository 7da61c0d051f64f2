import {
  OpenApiBuilder,
  type HeadersObject,
  type OpenAPIObject,
  type OperationObject,
  type ParameterObject,
  type ResponseObject,
  type SchemaObject,
} from 'openapi3-ts/oas31';
import { z } from 'zod';
import type { AnyContract, Example } from '@/lib/contracts/contract';
import { apiVersion } from '@/lib/contracts/openapi';
import { type ProblemCode, problemKinds } from '@/lib/contracts/problem';
import { roleMay, ruleOf } from '@/lib/permissions';
import { componentSchemas, nameOf, reference } from './components';
import { contracts } from './contracts';

/** Problems that any call can meet. */
const everyCall: readonly ProblemCode[] = ['unauthenticated', 'method', 'internal'];
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
        'Milnor–Witt K-theory over REST: canonical forms, decided equalities and residues, and the register of a group. JSON in and out; what cannot be answered comes back as a problem document (RFC 9457). Computations need no account below a quota for each address; the register needs a token.',
    })
    .addServer({ url: '/' })
    .addSecurityScheme('token', {
      type: 'http',
      scheme: 'bearer',
      description: 'A token that a member makes on the account page, for one group and with scopes.',
    });
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
    description: `${contract.description}${needs(contract)}`,
    security: [...(roleMay('visitor', contract.permission) ? [{}] : []), { token: [] }],
    ...(parameters(contract).length === 0 ? {} : { parameters: parameters(contract) }),
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
    responses: { [contract.success ?? 200]: success(contract), ...declines(contract) },
  };
}

/** What a token needs for the call, in a sentence. */
function needs({ permission }: AnyContract): string {
  const { from, scope } = ruleOf(permission);
  const role = from === 'visitor' ? '' : ` Whoever asks must be ${from === 'author' ? 'an' : 'a'} ${from} or more.`;
  return scope === 'any' || scope === 'none' ? role : `${role} A token needs the scope \`${scope}\`.`;
}

function parameters({ params, query, idempotent }: AnyContract): ParameterObject[] {
  const key: ParameterObject = {
    name: 'Idempotency-Key',
    in: 'header',
    description: 'A word of the caller for this request: sent again with the same key, it makes nothing new.',
    schema: { type: 'string', minLength: 1, maxLength: 200 },
  };
  return [
    ...(params === undefined ? [] : parametersOf(params, 'path')),
    ...(query === undefined ? [] : parametersOf(query, 'query')),
    ...(idempotent === true ? [key] : []),
  ];
}

function parametersOf(schema: z.ZodObject, place: 'path' | 'query'): ParameterObject[] {
  const { properties = {}, required = [] } = z.toJSONSchema(schema, { io: 'input' });
  return Object.entries(properties).map(([name, property]) => {
    const { description, ...rest } = property as SchemaObject;
    return { name, in: place, required: required.includes(name), description, schema: rest };
  });
}

const success = (contract: AnyContract): ResponseObject => ({
  description: contract.summary,
  headers: { ...requestIdHeader, ...(isCounted(contract) ? quotaHeaders : {}) },
  content: {
    'application/json': {
      schema: { $ref: reference(nameOf(contract.answer)) },
      examples: examples(contract.examples, 'answer'),
    },
    ...Object.fromEntries(
      Object.values(contract.files ?? {}).map((media) => [media, { schema: { type: 'string' as const } }]),
    ),
  },
});

const examples = (all: readonly Example[], side: 'request' | 'answer') =>
  Object.fromEntries(all.map((example) => [example.name, { summary: example.summary, value: example[side] }]));

/** Everything but what says how the service or the token is counts towards the quota. */
const isCounted = ({ permission }: AnyContract): boolean =>
  permission !== 'service-state' && permission !== 'token-state';

/** Whether a caller who is known may lack what the call needs. */
const canBeForbidden = ({ permission }: AnyContract): boolean =>
  ruleOf(permission).scope !== 'any' || !roleMay('reader', permission);

/** One response for each status, its description listing every problem of that status. */
function declines(contract: AnyContract): Record<string, ResponseObject> {
  const codes = new Set<ProblemCode>([
    ...everyCall,
    ...(contract.request === undefined ? [] : withBody),
    ...(isCounted(contract) ? counted : []),
    ...(canBeForbidden(contract) ? (['forbidden'] as const) : []),
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
  'RateLimit-Limit': header(
    'Questions an address, or a token, has in a minute; absent when there is no quota.',
    'integer',
  ),
  'RateLimit-Remaining': header('How many of them are left.', 'integer'),
  'RateLimit-Reset': header('Seconds until all of them are there again.', 'integer'),
};

function declineHeaders(status: string): HeadersObject {
  if (status === '401') return { 'WWW-Authenticate': header('Bearer.', 'string') };
  if (status === '405') return { Allow: header('The methods that answer.', 'string') };
  if (status === '429' || status === '503') return { 'Retry-After': header('Seconds to wait.', 'integer') };
  return {};
}
