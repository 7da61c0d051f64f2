'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { z } from 'zod';
import type { PermissionName } from '@/lib/contracts/permission-name';
import type { Member } from '@/lib/people/caller';
import { changeRole } from '@/lib/people/change-role';
import { memberWho } from '@/lib/people/current';
import { given } from '@/lib/people/given';
import { waitingInvitations } from '@/lib/people/invitations';
import { invite } from '@/lib/people/invite';
import { leaveGroup } from '@/lib/people/leave-group';
import { isRefused } from '@/lib/people/refused';
import { removeMember } from '@/lib/people/remove-member';
import { renameGroup } from '@/lib/people/rename-group';
import { revokeInvitation } from '@/lib/people/revoke-invitation';
import type { FormState } from '../_components/form/form-state';
import { readForm, refusal } from '../_components/form/read-form';

const here = z.object({ group: given.slug });
const invitation = z.object({ email: given.email, role: given.role });
const seat = z.object({ person: given.id, role: given.role });
const person = z.object({ person: given.id });
const naming = z.object({ name: given.groupName });

const notAllowed: FormState = {
  fault: 'This was not done: you are no longer signed in to this group, or your role has changed. Read the page again.',
};

/**
 * Runs what a member with a permission asks of the group whose page it was sent from. The same browser may have gone over to
 * another group meanwhile, and what was meant for one must not happen to the other.
 */
async function inGroup(
  permission: PermissionName,
  form: FormData,
  run: (member: Member) => Promise<FormState>,
): Promise<FormState> {
  const member = await memberWho(permission);
  const read = readForm(here, form);
  if (member === undefined || 'errors' in read || read.given.group !== member.group.slug) return notAllowed;
  const state = await run(member);
  if (state.done !== undefined) revalidatePath('/', 'layout');
  return state;
}

export async function sendInvitation(_before: FormState, form: FormData): Promise<FormState> {
  return inGroup('members-manage', form, async (member) => {
    const read = readForm(invitation, form);
    if ('errors' in read) return read;
    const sent = await invite(member, read.given);
    if (isRefused(sent)) return refusal(sent);
    return { done: `An invitation is on its way to ${read.given.email}, as ${read.given.role}.` };
  });
}

/** Sends an invitation again, or takes it back: the button that was pressed says which. */
export async function changeInvitation(_before: FormState, form: FormData): Promise<FormState> {
  return inGroup('members-manage', form, async (member) => {
    const renew = given.id.safeParse(form.get('renew'));
    if (renew.success) {
      const waiting = (await waitingInvitations(member.group.id)).find(({ id }) => id === renew.data);
      if (waiting === undefined) return { fault: 'This invitation is no longer open. Read the page again.' };
      const sent = await invite(member, waiting);
      return isRefused(sent)
        ? { fault: sent.refused }
        : { done: `A new invitation is on its way to ${waiting.email}; the link of the old one no longer works.` };
    }
    const revoke = given.id.safeParse(form.get('revoke'));
    if (!revoke.success) return notAllowed;
    const revoked = await revokeInvitation(member, revoke.data);
    return isRefused(revoked) ? refusal(revoked) : { done: `The invitation of ${revoked.email} is taken back.` };
  });
}

export async function giveRole(_before: FormState, form: FormData): Promise<FormState> {
  return inGroup('members-manage', form, async (member) => {
    const read = readForm(seat, form);
    if ('errors' in read) return read;
    const changed = await changeRole(member, { userId: read.given.person, role: read.given.role });
    return isRefused(changed) ? refusal(changed) : { done: `${changed.name} is ${changed.role} now.` };
  });
}

export async function remove(_before: FormState, form: FormData): Promise<FormState> {
  return inGroup('members-manage', form, async (member) => {
    const read = readForm(person, form);
    if ('errors' in read) return notAllowed;
    const removed = await removeMember(member, read.given.person);
    return isRefused(removed) ? refusal(removed) : { done: `${removed.name} is no longer in the group.` };
  });
}

export async function rename(_before: FormState, form: FormData): Promise<FormState> {
  return inGroup('members-manage', form, async (member) => {
    const read = readForm(naming, form);
    if ('errors' in read) return read;
    const renamed = await renameGroup(member, read.given.name);
    return isRefused(renamed) ? refusal(renamed) : { done: `The group is called “${renamed.name}” now.` };
  });
}

export async function leave(_before: FormState, form: FormData): Promise<FormState> {
  return inGroup('members-read', form, async (member) => {
    const left = await leaveGroup(member);
    if (isRefused(left)) return refusal(left);
    redirect('/account?said=left');
  });
}
