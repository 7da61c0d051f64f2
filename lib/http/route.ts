import 'server-only';
import type { z } from 'zod';
import type { Reply } from '@/lib/compute/request';
import type { AnyContract, Contract } from '@/lib/contracts/contract';
import { type Problem, problemOf } from '@/lib/contracts/problem';
import { shapeProblem } from '@/lib/contracts/shape';
import { may } from '@/lib/permissions';
import type { Caller } from '@/lib/people/caller';
import { readBody } from './body';
import { callerOf } from './caller';
import { addressOf, foreignMethod } from './incoming';
import { takeQuota } from './quota';
import { requestId } from './request-id';
import { fileResponse, jsonResponse, problemResponse } from './respond';
import type { SentFile } from './sent-file';

type Context = { readonly params: Promise<Record<string, string | string[] | undefined>> };
type Handler = (request: Request, context: Context) => Promise<Response>;
type Guarded = (request: Request, headers: Readonly<Record<string, string>>, context: Context) => Promise<Response>;

const methods = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS'] as const;

/** Every method the server hands on. */
export type Handlers = Readonly<Record<(typeof methods)[number], Handler>>;

type Parsed<Schema> = Schema extends z.ZodType ? z.infer<Schema> : undefined;

/** One valid request of a caller who has the permission for it. */
export interface Asked<Body, Params, Query> {
  readonly body: Body;
  readonly params: Params;
  readonly query: Query;
  readonly caller: Caller;
  readonly idempotencyKey: string | undefined;
}

/** What a service gives: its answer, a file with it, or why there is none. */
export type Served<Answer> = Reply<Answer> | { readonly file: SentFile };

export interface Service<Body, Answer, Params = undefined, Query = undefined> {
  /** Serves one valid request. `signal` is aborted when the client goes away. */
  readonly serve: (asked: Asked<Body, Params, Query>, signal: AbortSignal) => Promise<Served<Answer>>;
  /** How many computations the request counts as. */
  readonly cost: (body: Body) => number;
}

/** The status proposed for a request whose client has gone away; nobody reads it. */
const clientGone = 499;

/** A contract with the service bound to it: one method of an address. */
export interface Bound {
  readonly method: 'GET' | 'POST';
  readonly handle: Handler;
}

/**
 * Binds a contract to a service: caller, permission, path, query, content type, size, JSON, shape and quota are settled here,
 * in this order, and whatever goes wrong becomes a problem document.
 */
export function bind<
  Request extends z.ZodType | undefined,
  Answer extends z.ZodType,
  Params extends z.ZodObject | undefined,
  Query extends z.ZodObject | undefined,
>(
  contract: Contract<Request, Answer, Params, Query>,
  service: Service<Parsed<Request>, z.infer<Answer>, Parsed<Params>, Parsed<Query>>,
): Bound {
  const handle = guarded(async (request, headers, context) => {
    const sender = await callerOf(request);
    if ('problem' in sender) return problemResponse(sender.problem, { ...headers, ...challenge });
    const { caller } = sender;
    if (!may(caller, contract.permission)) return refusal(caller, headers);
    const read = await readValid(contract, request, context);
    if ('problem' in read) return problemResponse(read.problem, headers);
    // The schemas of this very contract have just accepted all three.
    const asked = { ...read, caller } as Asked<Parsed<Request>, Parsed<Params>, Parsed<Query>>;
    const cost = service.cost(asked.body);
    const token = caller.kind === 'member' ? caller.token?.id : undefined;
    const quota = cost === 0 ? { headers: {} } : await takeQuota(addressOf(request.headers), token, cost);
    const all = { ...headers, ...quota.headers };
    if (quota.problem !== undefined) return problemResponse(quota.problem, all);
    const reply = await service.serve(asked, request.signal);
    if ('file' in reply) return fileResponse(reply.file, all);
    return 'answer' in reply
      ? jsonResponse(reply.answer, contract.success ?? 200, all)
      : problemResponse(reply.problem, all);
  });
  return { method: contract.method, handle };
}

const challenge = { 'WWW-Authenticate': 'Bearer' } as const;

/** Whoever is nobody here may come back with a token; whoever is somebody lacks a role or a scope. */
function refusal(caller: Caller, headers: Readonly<Record<string, string>>): Response {
  if (caller.kind === 'visitor')
    return problemResponse(problemOf('unauthenticated', 'This call needs a token of a member of a group.'), {
      ...headers,
      ...challenge,
    });
  const lacks = caller.token === undefined ? 'your role in this group' : 'your role in this group, or this token';
  return problemResponse(problemOf('forbidden', `That is more than ${lacks} allows.`), headers);
}

type Valid = Omit<Asked<unknown, unknown, unknown>, 'caller'>;

async function readValid(
  contract: AnyContract,
  request: Request,
  context: Context,
): Promise<Valid | { readonly problem: Problem }> {
  const given = await context.params;
  const params = contract.params?.safeParse(given);
  // An address that cannot be one is an address where nothing is.
  if (params?.success === false) return { problem: problemOf('not-found', 'There is nothing here that you can see.') };
  const texts = Object.fromEntries(new URL(request.url).searchParams);
  const query = contract.query?.safeParse(texts);
  if (query?.success === false) return { problem: shapeProblem(query.error, texts) };
  const idempotencyKey = contract.idempotent === true ? request.headers.get('idempotency-key') : null;
  if (idempotencyKey !== null && !/^[\x20-\x7e]{1,200}$/.test(idempotencyKey))
    return { problem: problemOf('idempotency-key', 'An Idempotency-Key has 1 to 200 printable characters.') };
  const rest = { params: params?.data, query: query?.data, idempotencyKey: idempotencyKey ?? undefined };
  if (contract.request === undefined) return { body: undefined, ...rest };
  const read = await readBody(request);
  if ('problem' in read) return read;
  const valid = contract.request.safeParse(read.body);
  return valid.success ? { body: valid.data, ...rest } : { problem: shapeProblem(valid.error, read.body) };
}

/** The handlers of an address that answers one or two methods; whoever comes with another one is told which. */
export function address(...bound: readonly Bound[]): Handlers {
  const names = bound.flatMap(({ method }) => (method === 'GET' ? ['GET', 'HEAD'] : [method]));
  const allow = [...names, 'OPTIONS'].join(', ');
  const refuse = guarded(async (request, headers) =>
    problemResponse(
      problemOf(
        'method',
        `${foreignMethod(request.headers) ?? request.method} does not answer here. Use ${bound.map(({ method }) => method).join(' or ')}.`,
      ),
      { ...headers, Allow: allow },
    ),
  );
  const options = guarded(async (request, headers, context) =>
    foreignMethod(request.headers) === undefined
      ? new Response(null, { status: 204, headers: { ...headers, Allow: allow } })
      : refuse(request, context),
  );
  const handlerOf = (method: (typeof methods)[number]): Handler =>
    method === 'OPTIONS'
      ? options
      : (bound.find((one) => one.method === (method === 'HEAD' ? 'GET' : method))?.handle ?? refuse);
  return Object.fromEntries(methods.map((method) => [method, handlerOf(method)])) as Handlers;
}

/** The handlers of an address that answers one method. */
export const route = <
  Request extends z.ZodType | undefined,
  Answer extends z.ZodType,
  Params extends z.ZodObject | undefined,
  Query extends z.ZodObject | undefined,
>(
  contract: Contract<Request, Answer, Params, Query>,
  service: Service<Parsed<Request>, z.infer<Answer>, Parsed<Params>, Parsed<Query>>,
): Handlers => address(bind(contract, service));

/** Gives the request its id, and turns what is thrown into a problem document that tells nothing of the inside. */
export function guarded(handle: Guarded): Handler {
  return async (request, context) => {
    const id = requestId(request.headers);
    const headers = { 'X-Request-Id': id };
    try {
      return await handle(request, headers, context);
    } catch (error) {
      if (request.signal.aborted) return new Response(null, { status: clientGone });
      console.error(`Request ${id} failed:`, error);
      return problemResponse(
        problemOf('internal', `Something failed here. Name the request id ${id} when you report it.`),
        headers,
      );
    }
  };
}
