/** What an API token may be used for. */
export const scopes = ['read', 'compute', 'write'] as const;
export type Scope = (typeof scopes)[number];
