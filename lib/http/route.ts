import 'server-only';
import type { z } from 'zod';
import type { Reply } from '@/lib/compute/request';
import type { AnyContract, Contract } from '@/lib/contracts/contract';
import { type Problem, problemOf } from '@/lib/contracts/problem';
import { shapeProblem } from '@/lib/contracts/shape';
import { may } from '@/lib/permissions';
import { readBody } from './body';
import { addressOf, foreignMethod } from './incoming';
import { takeQuota } from './quota';
import { requestId } from './request-id';
import { jsonResponse, problemResponse } from './respond';

type Handler = (request: Request) => Promise<Response>;

/** Every method the server hands on. */
export interface Handlers {
  readonly GET: Handler;
  readonly HEAD: Handler;
  readonly POST: Handler;
  readonly PUT: Handler;
  readonly PATCH: Handler;
  readonly DELETE: Handler;
  readonly OPTIONS: Handler;
}

export interface Service<Body, Answer> {
  /** Serves one valid request. `signal` is aborted when the client goes away. */
  readonly serve: (body: Body, signal: AbortSignal) => Promise<Reply<Answer>>;
  /** How many computations the request counts as. */
  readonly cost: (body: Body) => number;
}

type BodyOf<Request> = Request extends z.ZodType ? z.infer<Request> : undefined;

/** The status proposed for a request whose client has gone away; nobody reads it. */
const clientGone = 499;

/**
 * Binds a contract to a service: method, permission, content type, size, JSON, shape and quota are settled here, in this
 * order, and whatever goes wrong becomes a problem document.
 */
export function route<Request extends z.ZodType | undefined, Answer extends z.ZodType>(
  contract: Contract<Request, Answer>,
  service: Service<BodyOf<Request>, z.infer<Answer>>,
): Handlers {
  const handle = guarded(async (request, headers) => {
    if (!may('visitor', contract.permission))
      return problemResponse(problemOf('forbidden', 'This call needs a permission that the caller lacks.'), headers);
    const read = await readValid(contract, request);
    if ('problem' in read) return problemResponse(read.problem, headers);
    // The schema of this very contract has just accepted the body.
    const body = read.body as BodyOf<Request>;
    const cost = service.cost(body);
    const quota = cost === 0 ? { headers: {} } : await takeQuota(addressOf(request.headers), cost);
    const all = { ...headers, ...quota.headers };
    if (quota.problem !== undefined) return problemResponse(quota.problem, all);
    const reply = await service.serve(body, request.signal);
    return 'answer' in reply ? jsonResponse(reply.answer, 200, all) : problemResponse(reply.problem, all);
  });
  return handlers(contract.method, handle);
}

async function readValid(
  contract: AnyContract,
  request: Request,
): Promise<{ readonly body: unknown } | { readonly problem: Problem }> {
  if (contract.request === undefined) return { body: undefined };
  const read = await readBody(request);
  if ('problem' in read) return read;
  const valid = contract.request.safeParse(read.body);
  return valid.success ? { body: valid.data } : { problem: shapeProblem(valid.error, read.body) };
}

/** One method is served; the others are told which. */
function handlers(method: 'GET' | 'POST', handle: Handler): Handlers {
  const allow = method === 'GET' ? 'GET, HEAD, OPTIONS' : 'POST, OPTIONS';
  const refuse = guarded(async (request, headers) =>
    problemResponse(
      problemOf('method', `${foreignMethod(request.headers) ?? request.method} does not answer here. Use ${method}.`),
      { ...headers, Allow: allow },
    ),
  );
  const options: Handler = guarded(async (request, headers) =>
    foreignMethod(request.headers) === undefined
      ? new Response(null, { status: 204, headers: { ...headers, Allow: allow } })
      : refuse(request),
  );
  return {
    GET: method === 'GET' ? handle : refuse,
    HEAD: method === 'GET' ? handle : refuse,
    POST: method === 'POST' ? handle : refuse,
    PUT: refuse,
    PATCH: refuse,
    DELETE: refuse,
    OPTIONS: options,
  };
}

/** Gives the request its id, and turns what is thrown into a problem document that tells nothing of the inside. */
export function guarded(
  handle: (request: Request, headers: Readonly<Record<string, string>>) => Promise<Response>,
): Handler {
  return async (request) => {
    const id = requestId(request.headers);
    const headers = { 'X-Request-Id': id };
    try {
      return await handle(request, headers);
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
