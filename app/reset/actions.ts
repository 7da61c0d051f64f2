'use server';

import { headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { z } from 'zod';
import { addressOf } from '@/lib/http/incoming';
import { openSession } from '@/lib/people/browser-session';
import { given } from '@/lib/people/given';
import { isRefused } from '@/lib/people/refused';
import { requestReset } from '@/lib/people/request-reset';
import { setPassword } from '@/lib/people/set-password';
import type { FormState } from '../_components/form/form-state';
import { readForm, refusal } from '../_components/form/read-form';

const asked = z.object({ email: given.email });
const chosen = z.object({ token: z.string().max(200), password: given.newPassword });

/** Has a link mailed; says the same whether or not the address has an account. */
export async function askForLink(_before: FormState, form: FormData): Promise<FormState> {
  const read = readForm(asked, form);
  if ('errors' in read) return read;
  const { email } = read.given;
  const outcome = await requestReset(email, addressOf(await headers()));
  if (isRefused(outcome)) return refusal(outcome);
  return { done: `If ${email} has an account, a link is on its way there. It is good for an hour.` };
}

/** Sets a new password by the link of a mail, and signs in. */
export async function choosePassword(_before: FormState, form: FormData): Promise<FormState> {
  const read = readForm(chosen, form);
  if ('errors' in read)
    return read.errors.token === undefined ? read : { fault: 'This link was cut short. Open it again from the mail.' };
  const outcome = await setPassword(read.given.token, read.given.password);
  if (isRefused(outcome)) return refusal(outcome);
  await openSession(outcome.userId, outcome.sessionVersion);
  redirect('/account?said=password');
}
