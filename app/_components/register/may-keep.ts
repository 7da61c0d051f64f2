import type { Caller } from '@/lib/people/caller';
import { may } from '@/lib/permissions';

/** Whether to offer keeping: to whoever may, and to whoever has yet to sign in. */
export const mayKeep = (caller: Caller): boolean => caller.person === undefined || may(caller, 'identity-write');
