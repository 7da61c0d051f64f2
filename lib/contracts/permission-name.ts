/** What a call needs permission for. Who has which permission is decided in one table, `lib/permissions.ts`. */
export type PermissionName = 'compute' | 'service-state';
