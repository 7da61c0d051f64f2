/** What a member with a role does, the least first: "A member with this role …". */
export const roleWords = {
  reader: 'reads the register and sees who is in the group',
  author: 'reads, and keeps, revises and withdraws identities',
  reviewer: 'does all that an author does, and looks again at what others kept',
  steward: 'does all that a reviewer does, invites and removes members, and gives roles',
} as const;

export type RoleName = keyof typeof roleWords;

export const roleNames = Object.keys(roleWords) as readonly RoleName[];
