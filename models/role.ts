/** What a member of a group may be, each more than the one before. */
export const memberRoles = ['reader', 'author', 'reviewer', 'steward'] as const;
export type MemberRole = (typeof memberRoles)[number];
