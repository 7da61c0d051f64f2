'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { isAnswer } from '@/lib/compute/request';
import { visibilityRequest, withdrawRequest } from '@/lib/contracts/identities';
import { identityRevision } from '@/lib/contracts/identity-content';
import { identityKey } from '@/lib/contracts/identity-key';
import type { IdentityOutcome } from '@/lib/contracts/identity-outcome';
import { memberWho } from '@/lib/people/current';
import { dropDraft } from '@/lib/register/drafts';
import { contentOfForm, errorsOfShape, formOfBrowser, outcomeOfProblem } from '@/lib/register/read-form';
import { recheckIdentity } from '@/lib/register/recheck';
import { reviseIdentity } from '@/lib/register/revise';
import { changeVisibility } from '@/lib/register/visibility';
import { withdrawIdentity } from '@/lib/register/withdraw';
import { identityHref } from '../_components/register/identity-address';

/** What became of something done to an identity. */
export interface DeedOutcome {
  readonly done?: string;
  readonly fault?: string;
}

const notNow: DeedOutcome = {
  fault: 'You are signed out, or may not change identities any more. Sign in in another window, and try again.',
};
const unreadable: DeedOutcome = { fault: 'The form did not arrive as it was sent. Read the page again.' };

/** Makes a new revision and goes to it; or says what has to change, or who was faster. */
export async function revise(key: unknown, base: unknown, given: unknown): Promise<IdentityOutcome> {
  const member = await memberWho('identity-write');
  if (member === undefined) return notNow;
  const form = formOfBrowser(given);
  const place = identityKey.safeParse(key);
  if (form === undefined || !place.success) return unreadable;
  const change = form.change.trim() === '' ? {} : { change: form.change };
  const revision = identityRevision.safeParse({ ...contentOfForm(form), ...change, base });
  if (!revision.success) return errorsOfShape(revision.error);
  const reply = await reviseIdentity(member, place.data, revision.data);
  if (!isAnswer(reply)) return outcomeOfProblem(reply.problem);
  await dropDraft(member.person.id, `revise:${place.data}`);
  redirect(identityHref(reply.answer.key));
}

/** Withdraws an identity, with the reason. */
export async function withdraw(key: unknown, base: unknown, reason: unknown): Promise<DeedOutcome> {
  const member = await memberWho('identity-write');
  if (member === undefined) return notNow;
  const place = identityKey.safeParse(key);
  const given = withdrawRequest.safeParse({ base, reason });
  if (!place.success) return unreadable;
  if (!given.success) return { fault: 'Say in a sentence why nobody should rely on it: at most 500 characters.' };
  const reply = await withdrawIdentity(member, place.data, given.data);
  if (!isAnswer(reply))
    return {
      fault:
        reply.problem.code === 'conflict'
          ? 'It was changed meanwhile. Read the page again, and withdraw it then if it is still wrong.'
          : reply.problem.detail,
    };
  revalidatePath(identityHref(place.data));
  return { done: 'It is withdrawn. It stays in the register, with your reason.' };
}

const found = {
  equal: 'Checked again: equal.',
  different: 'Checked again: different.',
  undecided: 'Checked again: still undecided.',
  stopped: 'The check was stopped at its limit.',
  refused: 'This engine does not decide it yet.',
} as const;

/** Checks the current revision with the engine of today. */
export async function recheck(key: unknown): Promise<DeedOutcome> {
  const member = await memberWho('identity-write');
  if (member === undefined) return notNow;
  const place = identityKey.safeParse(key);
  if (!place.success) return unreadable;
  const reply = await recheckIdentity(member, place.data);
  if (!isAnswer(reply)) return { fault: reply.problem.detail };
  revalidatePath(identityHref(place.data));
  const verdict = reply.answer.lastCheck?.verdict;
  return { done: verdict === undefined ? 'Checked again.' : found[verdict] };
}

/** Shows an identity to the group alone, or to anyone who has its link. */
export async function show(key: unknown, visibility: unknown): Promise<DeedOutcome> {
  const member = await memberWho('identity-write');
  if (member === undefined) return notNow;
  const place = identityKey.safeParse(key);
  const given = visibilityRequest.safeParse({ visibility });
  if (!place.success || !given.success) return unreadable;
  const reply = await changeVisibility(member, place.data, given.data.visibility);
  if (!isAnswer(reply)) return { fault: reply.problem.detail };
  revalidatePath(identityHref(place.data));
  return {
    done:
      given.data.visibility === 'public'
        ? 'Anyone who has the link can read it now.'
        : 'Only the group can see it now. The link leads nobody else here any more.',
  };
}
