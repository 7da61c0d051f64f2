import type { Caller, Member } from '@/lib/people/caller';

/** The caller of a route whose permission no visitor has. */
export function memberOf(caller: Caller): Member {
  if (caller.kind === 'visitor') throw new Error('A visitor was let through to what members alone may do.');
  return caller;
}
