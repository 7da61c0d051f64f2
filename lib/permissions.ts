import type { PermissionName } from '@/lib/contracts/permission-name';
import type { Caller } from '@/lib/people/caller';
import { memberRoles, type MemberRole } from '@/models/role';
import type { Scope } from '@/models/scope';

/** Who asks. A visitor is anyone without a seat in a group. */
export type Role = 'visitor' | MemberRole;

/** Every role has all that the one before it has. */
export const roles: readonly Role[] = ['visitor', ...memberRoles];

interface Rule {
  /** The least role that has the permission. */
  readonly from: Role;
  /** The scope that a token needs for it; `any` when every token will do, `none` when no token ever does. */
  readonly scope: Scope | 'any' | 'none';
}

/** The one table that every page, action and call asks. */
const rules: Record<PermissionName, Rule> = {
  'service-state': { from: 'visitor', scope: 'any' },
  compute: { from: 'visitor', scope: 'compute' },
  // one identity by its key: what is not of the caller's group must be public, else it does not exist for the caller
  'identity-open': { from: 'visitor', scope: 'read' },
  'register-read': { from: 'reader', scope: 'read' },
  'identity-write': { from: 'author', scope: 'write' },
  'token-state': { from: 'reader', scope: 'any' },
  account: { from: 'visitor', scope: 'none' },
  'members-read': { from: 'reader', scope: 'none' },
  'members-manage': { from: 'steward', scope: 'none' },
  'audit-read': { from: 'steward', scope: 'none' },
};

export const ruleOf = (permission: PermissionName): Rule => rules[permission];

export const roleOf = (caller: Caller): Role => (caller.kind === 'member' ? caller.group.role : 'visitor');

/** Whether a role has a permission, by itself. */
export const roleMay = (role: Role, permission: PermissionName): boolean =>
  roles.indexOf(role) >= roles.indexOf(rules[permission].from);

/** Whether a caller has a permission: by the role, and by the scopes of the token if it comes with one. */
export function may(caller: Caller, permission: PermissionName): boolean {
  if (!roleMay(roleOf(caller), permission)) return false;
  if (caller.kind === 'visitor' || caller.token === undefined) return true;
  const { scope } = rules[permission];
  return scope === 'any' || (scope !== 'none' && caller.token.scopes.includes(scope));
}
