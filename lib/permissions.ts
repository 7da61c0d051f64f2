import type { PermissionName } from '@/lib/contracts/permission-name';

/** Who asks. A visitor is anyone without an account. */
export type Role = 'visitor';

/** Which roles have which permission: the one table that every page and call asks. */
const permitted: Record<PermissionName, readonly Role[]> = {
  compute: ['visitor'],
  'service-state': ['visitor'],
};

/** Whether a role has a permission. */
export const may = (role: Role, permission: PermissionName): boolean => permitted[permission].includes(role);
