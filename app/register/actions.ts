'use server';

import { redirect } from 'next/navigation';
import { isAnswer } from '@/lib/compute/request';
import { identityContent } from '@/lib/contracts/identity-content';
import type { IdentityOutcome } from '@/lib/contracts/identity-outcome';
import { memberWho } from '@/lib/people/current';
import { dropDraft } from '@/lib/register/drafts';
import { keepIdentity } from '@/lib/register/keep';
import { contentOfForm, errorsOfShape, formOfBrowser, outcomeOfProblem } from '@/lib/register/read-form';
import { identityHref } from '../_components/register/identity-address';

const notNow: IdentityOutcome = {
  fault: 'You are signed out, or may not keep identities any more. Sign in in another window, and send it again.',
};

/** Keeps a new identity and goes to its page; or says what has to change. */
export async function keep(_: unknown, given: unknown): Promise<IdentityOutcome> {
  const member = await memberWho('identity-write');
  if (member === undefined) return notNow;
  const form = formOfBrowser(given);
  if (form === undefined) return { fault: 'The form did not arrive as it was sent. Read the page again.' };
  const content = identityContent.safeParse({ ...contentOfForm(form), visibility: form.visibility });
  if (!content.success) return errorsOfShape(content.error);
  const reply = await keepIdentity(member, content.data);
  if (!isAnswer(reply)) return outcomeOfProblem(reply.problem);
  await dropDraft(member.person.id, 'keep');
  redirect(identityHref(reply.answer.key));
}
