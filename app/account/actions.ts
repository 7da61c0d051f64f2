'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { z } from 'zod';
import { closeSession, openSession, rememberGroup } from '@/lib/people/browser-session';
import { changeName } from '@/lib/people/change-name';
import { changePassword } from '@/lib/people/change-password';
import { currentCaller } from '@/lib/people/current';
import { endSessions } from '@/lib/people/end-sessions';
import { given } from '@/lib/people/given';
import { isRefused } from '@/lib/people/refused';
import { seatsOf } from '@/lib/people/seats';
import type { FormState } from '../_components/form/form-state';
import { readForm, refusal } from '../_components/form/read-form';

const signedOut: FormState = { fault: 'You are signed out. Sign in again; what you typed is still here.' };

const naming = z.object({ name: given.personName });
const passwords = z.object({ current: given.password, next: given.newPassword });
const choice = z.object({ group: given.slug });

export async function saveName(_before: FormState, form: FormData): Promise<FormState> {
  const { person } = await currentCaller();
  if (person === undefined) return signedOut;
  const read = readForm(naming, form);
  if ('errors' in read) return read;
  await changeName(person.id, read.given.name);
  revalidatePath('/', 'layout');
  return { done: `You are called ${read.given.name} now.` };
}

/** A new password ends every session; this browser is let in again. */
export async function savePassword(_before: FormState, form: FormData): Promise<FormState> {
  const { person } = await currentCaller();
  if (person === undefined) return signedOut;
  const read = readForm(passwords, form);
  if ('errors' in read) return read;
  const changed = await changePassword(person, read.given);
  if (isRefused(changed)) return refusal(changed);
  await openSession(person.id, changed.sessionVersion);
  return { done: 'Your password is changed. Every other device is signed out.' };
}

/** Goes over into another of one's groups. */
export async function switchGroup(_before: FormState, form: FormData): Promise<FormState> {
  const { person } = await currentCaller();
  if (person === undefined) return signedOut;
  const read = readForm(choice, form);
  const seats = await seatsOf(person.id);
  const seat = 'given' in read ? seats.find(({ slug }) => slug === read.given.group) : undefined;
  if (seat === undefined) return { fault: 'You are no longer in this group. Read the page again.' };
  await rememberGroup(seat.slug);
  revalidatePath('/', 'layout');
  return { done: `You are in “${seat.name}” now.` };
}

export async function signOut(): Promise<FormState> {
  await closeSession();
  redirect('/sign-in?said=out');
}

export async function signOutEverywhere(): Promise<FormState> {
  const { person } = await currentCaller();
  if (person !== undefined) await endSessions(person.id);
  await closeSession();
  redirect('/sign-in?said=everywhere');
}
