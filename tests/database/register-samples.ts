import { isAnswer, type Reply } from '@/lib/compute/request';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { type IdentityContent, identityContent } from '@/lib/contracts/identity-content';
import type { Problem } from '@/lib/contracts/problem';
import type { Member } from '@/lib/people/caller';
import { keepIdentity } from '@/lib/register/keep';

/** A relation of one symbol, with some of it written otherwise. */
export const content = (change: Record<string, unknown> = {}): IdentityContent =>
  identityContent.parse({
    name: 'Square of a symbol',
    field: 'any',
    statement: '[a][a] = [-1][a]',
    hypotheses: ['a != 1'],
    ...change,
  });

/** The answer of a reply that must be one. */
export function answered<Answer>(reply: Reply<Answer>): Answer {
  if (isAnswer(reply)) return reply.answer;
  throw new Error(`${reply.problem.code}: ${reply.problem.detail}`);
}

/** The problem of a reply that must be one. */
export function refused(reply: Reply<unknown>): Problem {
  if (!isAnswer(reply)) return reply.problem;
  throw new Error('An answer came where a problem was expected.');
}

export const keep = async (member: Member, change: Record<string, unknown> = {}): Promise<IdentityAnswer> =>
  answered(await keepIdentity(member, content(change)));
