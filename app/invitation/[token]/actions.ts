'use server';

import { headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { z } from 'zod';
import { waitWords } from '@/lib/contracts/wait';
import { addressOf } from '@/lib/http/incoming';
import { acceptAs, acceptAsNewcomer, type Joined } from '@/lib/people/accept-invitation';
import { closeSession, openSession, rememberGroup } from '@/lib/people/browser-session';
import { currentCaller } from '@/lib/people/current';
import { given } from '@/lib/people/given';
import { openInvitation } from '@/lib/people/open-invitation';
import { isRefused, type Refused } from '@/lib/people/refused';
import { checkPassword } from '@/lib/people/sign-in';
import type { FormState } from '../../_components/form/form-state';
import { readForm, refusal } from '../../_components/form/read-form';

const link = z.object({ token: z.string().max(200) });
const newcomer = z.object({ name: given.personName, password: given.newPassword });
const known = z.object({ password: given.password });

/**
 * Accepts an invitation: as the person who is signed in, or as the one with the invited address, who shows the password or
 * makes an account.
 */
export async function join(_before: FormState, form: FormData): Promise<FormState> {
  const address = addressOf(await headers());
  const token = readForm(link, form);
  if ('errors' in token) return { fault: 'This link was cut short. Open it again from the mail.' };
  const invitation = await openInvitation(token.given.token, address);
  if (invitation.state === 'too-often') return { fault: waitWords(invitation.seconds) };
  if (invitation.state !== 'open') redirect(`/invitation/${encodeURIComponent(token.given.token)}`);
  const { person } = await currentCaller();
  if (person !== undefined) return arrive(await acceptAs(token.given.token, person.id), false);
  if (!invitation.hasAccount) {
    const read = readForm(newcomer, form);
    return 'errors' in read ? read : arrive(await acceptAsNewcomer(token.given.token, read.given), true);
  }
  const read = readForm(known, form);
  if ('errors' in read) return read;
  const checked = await checkPassword(invitation.email, read.given.password, address);
  if (checked.outcome === 'too-often') return { fault: waitWords(checked.seconds) };
  if (checked.outcome === 'wrong') return { errors: { password: 'This is not the password of that account.' } };
  return arrive(await acceptAs(token.given.token, checked.id), true);
}

async function arrive(joined: Joined | Refused, signsIn: boolean): Promise<FormState> {
  if (isRefused(joined)) return refusal(joined);
  if (signsIn) await openSession(joined.userId, joined.sessionVersion);
  await rememberGroup(joined.slug);
  redirect('/register');
}

/** Signs out where an invitation is for someone else, and stays at its page. */
export async function stepAside(_before: FormState, form: FormData): Promise<FormState> {
  const token = readForm(link, form);
  await closeSession();
  redirect('given' in token ? `/invitation/${encodeURIComponent(token.given.token)}` : '/sign-in');
}
