import 'server-only';
import type { z } from 'zod';
import { compute } from '@/lib/compute/pool';
import type { AnswerOf, BodyOf, Kind } from '@/lib/compute/request';
import type { Contract } from '@/lib/contracts/contract';
import { type Handlers, route } from './route';

/** The handlers of a call that is one question to the engine. */
export const computeRoute = <K extends Kind>(
  kind: K,
  contract: Contract<z.ZodType<BodyOf[K]>, z.ZodType<AnswerOf[K]>>,
): Handlers => route(contract, { serve: ({ body }, signal) => compute(kind, body, { signal }), cost: () => 1 });
