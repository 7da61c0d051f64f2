'use server';

import { headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { z } from 'zod';
import { addressOf } from '@/lib/http/incoming';
import { openSession, rememberGroup } from '@/lib/people/browser-session';
import { currentCaller } from '@/lib/people/current';
import { given } from '@/lib/people/given';
import { isRefused } from '@/lib/people/refused';
import { startGroup } from '@/lib/people/start-group';
import type { FormState } from '../_components/form/form-state';
import { readForm, refusal } from '../_components/form/read-form';

const group = z.object({ group: given.groupName, slug: given.slug });
const founder = z.object({ name: given.personName, email: given.email, password: given.newPassword });

/** Starts a group; whoever is not signed in makes an account with it and is signed in. */
export async function start(_before: FormState, form: FormData): Promise<FormState> {
  const address = addressOf(await headers());
  const { person } = await currentCaller();
  const read = readForm(person === undefined ? group.extend(founder.shape) : group, form);
  if ('errors' in read) return read;
  const { group: name, slug, ...newcomer } = read.given;
  const started = await startGroup({ name, slug }, person ?? founder.parse(newcomer), address);
  if (isRefused(started)) return refusal(started);
  if (person === undefined) await openSession(started.userId, started.sessionVersion);
  await rememberGroup(started.slug);
  redirect('/group');
}
