'use server';

import { revalidatePath } from 'next/cache';
import type { FormState } from '@/app/_components/form/form-state';
import { refusal } from '@/app/_components/form/read-form';
import type { Member } from '@/lib/people/caller';
import { memberWho } from '@/lib/people/current';
import { isRefused } from '@/lib/people/refused';
import { makeToken } from '@/lib/tokens/make';
import { revokeToken } from '@/lib/tokens/revoke';

export interface TokenFormState extends FormState {
  /** The token that was made. It is told to this one page and never again. */
  readonly made?: { readonly id: string; readonly name: string; readonly secret: string };
}

const notAllowed = {
  fault: 'This was not done: you are no longer signed in to this group. Read the page again.',
};

/**
 * The member who sent the form, in the group whose page it was sent from: the same browser may have gone over to another group
 * meanwhile, and a token for one must not be made for the other.
 */
async function senderOf(form: FormData): Promise<Member | undefined> {
  const member = await memberWho('account');
  return member?.group.slug === textOf(form, 'group') ? member : undefined;
}

/** Makes a token for the member who is signed in. */
export async function makeTokenAction(_: FormState, form: FormData): Promise<TokenFormState> {
  const member = await senderOf(form);
  if (member === undefined) return notAllowed;
  const days = textOf(form, 'days').trim();
  const made = await makeToken(member, {
    name: textOf(form, 'name'),
    scopes: allOf(form, 'scopes'),
    days: /^\d{1,4}$/.test(days) ? Number(days) : Number.NaN,
  });
  if (isRefused(made)) return refusal(made);
  revalidatePath('/account/tokens');
  return { made: { id: made.id, name: made.name, secret: made.secret } };
}

/** Revokes a token of one's own, or for a steward any of the group. */
export async function revokeTokenAction(_: FormState, form: FormData): Promise<FormState> {
  const member = await senderOf(form);
  if (member === undefined) return notAllowed;
  const revoked = await revokeToken(member, textOf(form, 'id'));
  if (revoked.outcome === 'not-there') return { fault: 'There is no such token that you can revoke.' };
  revalidatePath('/account/tokens');
  revalidatePath('/group/tokens');
  return {};
}

// A server action can be called with anything, whatever its types say.
const allOf = (form: unknown, name: string): string[] =>
  form instanceof FormData ? form.getAll(name).filter((value) => typeof value === 'string') : [];

const textOf = (form: unknown, name: string): string => allOf(form, name)[0] ?? '';
