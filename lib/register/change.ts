import 'server-only';
import type { Transaction } from 'sequelize';
import { declined, type Reply } from '@/lib/compute/request';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { type Problem, problemOf } from '@/lib/contracts/problem';
import { database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { answerOf, openIdentity } from './open';
import { seatProblem } from './seat';
import { type Held, holdIdentity } from './store';

const nothing = problemOf('not-found', 'There is nothing here that you can see.');

/**
 * Changes an identity of the member's group under its lock. `base` is the revision the member has seen: when another one was
 * made since, nothing is changed and the answer is a conflict that has the current identity.
 */
export async function changeIdentity(
  member: Member,
  key: string,
  base: number | undefined,
  change: (held: Held, transaction: Transaction) => Promise<Problem | undefined>,
): Promise<Reply<IdentityAnswer>> {
  const problem = await database().transaction(async (transaction) => {
    const lost = await seatProblem(member, transaction);
    if (lost !== undefined) return lost;
    const held = await holdIdentity(member, key, transaction);
    if (held === undefined) return nothing;
    if (base !== undefined && held.revision !== base) return changedMeanwhile;
    return change(held, transaction);
  });
  if (problem === undefined) return answerOf(member, key);
  return problem.code === 'conflict' ? conflict(member, key, problem) : declined(problem);
}

const changedMeanwhile = problemOf(
  'conflict',
  'Another revision was made meanwhile; `current` has it. Yours was not kept: begin again from the current one.',
);

/** The conflict before anything was computed, when it is plain already. */
export async function earlyProblem(member: Member, key: string, base: number): Promise<Reply<never> | undefined> {
  const identity = await ownIdentity(member, key);
  if (identity === undefined) return declined(nothing);
  return identity.current === base ? undefined : conflict(member, key, changedMeanwhile);
}

/** The identity under a key, if it is one of the member's group. */
export async function ownIdentity(member: Member, key: string): Promise<IdentityAnswer | undefined> {
  const identity = await openIdentity(member, key);
  return identity?.group.slug === member.group.slug ? identity : undefined;
}

async function conflict(member: Member, key: string, problem: Problem): Promise<Reply<never>> {
  return declined({ ...problem, current: await openIdentity(member, key) });
}
