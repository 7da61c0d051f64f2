import { roleMay } from '@/lib/permissions';
import type { MemberRole } from '@/models/role';
import { type Scope, scopes } from '@/models/scope';

/** What each scope opens, for whoever chooses. */
export const scopeWords: Readonly<Record<Scope, string>> = {
  read: 'read the register',
  compute: 'ask the engine, with a quota of its own',
  write: 'keep, revise and withdraw identities',
};

/** The scopes that a token of somebody with this role may have. */
export const scopesOf = (role: MemberRole): readonly Scope[] =>
  scopes.filter((scope) => scope !== 'write' || roleMay(role, 'identity-write'));
