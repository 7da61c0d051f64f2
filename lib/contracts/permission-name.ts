/**
 * What a page, an action or a call needs permission for. Who has which permission is decided in one table,
 * `lib/permissions.ts`.
 */
export const permissionNames = [
  'service-state',
  'compute',
  'identity-open',
  'register-read',
  'identity-write',
  'token-state',
  'account',
  'members-read',
  'members-manage',
  'audit-read',
] as const;
export type PermissionName = (typeof permissionNames)[number];
