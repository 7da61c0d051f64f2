'use server';

import { revalidatePath } from 'next/cache';
import type { FormState } from '@/app/_components/form/form-state';
import { refusal } from '@/app/_components/form/read-form';
import { memberWho } from '@/lib/people/current';
import { isRefused } from '@/lib/people/refused';
import { makeToken } from '@/lib/tokens/make';
import { revokeToken } from '@/lib/tokens/revoke';

export interface TokenFormState extends FormState {
  /** The token that was made. It is told to this one page and never again. */
  readonly made?: { readonly id: string; readonly name: string; readonly secret: string };
}

const noMember = { fault: 'You are no longer signed in to a group. Sign in, and make the token then.' };

/** Makes a token for the member who is signed in. */
export async function makeTokenAction(_: FormState, form: FormData): Promise<TokenFormState> {
  const member = await memberWho('account');
  if (member === undefined) return noMember;
  if (!(form instanceof FormData)) return { fault: 'The form could not be read. Send it again.' };
  const made = await makeToken(member, {
    name: textOf(form, 'name'),
    scopes: form.getAll('scopes').filter((scope) => typeof scope === 'string'),
    days: /^\s*\d{1,4}\s*$/.test(textOf(form, 'days')) ? Number(textOf(form, 'days')) : Number.NaN,
  });
  if (isRefused(made)) return refusal(made);
  revalidatePath('/account/tokens');
  return { made: { id: made.id, name: made.name, secret: made.secret } };
}

/** Revokes a token of one's own, or for a steward any of the group. */
export async function revokeTokenAction(_: FormState, form: FormData): Promise<FormState> {
  const member = await memberWho('account');
  if (member === undefined) return noMember;
  const revoked = await revokeToken(member, form instanceof FormData ? textOf(form, 'id') : '');
  if (revoked.outcome === 'not-there') return { fault: 'There is no such token that you can revoke.' };
  revalidatePath('/account/tokens');
  revalidatePath('/group/tokens');
  return {};
}

function textOf(form: FormData, name: string): string {
  const value = form.get(name);
  return typeof value === 'string' ? value : '';
}
