import 'server-only';
import { cookies } from 'next/headers';
import { notFound, redirect } from 'next/navigation';
import { cache } from 'react';
import type { PermissionName } from '@/lib/contracts/permission-name';
import { may } from '@/lib/permissions';
import type { Caller, Member, Person } from './caller';
import { callerOfCookies } from './session';

/** Who asks for the page or the action that is being served; read once a request. */
export const currentCaller = cache(async (): Promise<Caller> => {
  const jar = await cookies();
  return callerOfCookies((name) => jar.get(name)?.value);
});

/** The person who is signed in, for a page; anyone else is sent to sign in and comes back. */
export async function requirePerson(path: string): Promise<Person> {
  const { person } = await currentCaller();
  if (person === undefined) redirect(`/sign-in?next=${encodeURIComponent(path)}`);
  return person;
}

/**
 * The member who is signed in and has this permission, for a page. Whoever is not signed in is sent to do so; for a member
 * without the permission there is no such page.
 */
export async function requireMember(permission: PermissionName, path: string): Promise<Member> {
  await requirePerson(path);
  const caller = await currentCaller();
  if (caller.kind === 'visitor') redirect('/account');
  if (!may(caller, permission)) notFound();
  return caller;
}

/** The member who is signed in and has this permission, for an action; undefined for anyone else. */
export async function memberWho(permission: PermissionName): Promise<Member | undefined> {
  const caller = await currentCaller();
  return caller.kind === 'member' && may(caller, permission) ? caller : undefined;
}
