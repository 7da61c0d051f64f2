/** Everything that is written down, and how the audit page says it: "Tobias Renk …". */
export const auditActions = {
  'group-started': 'started the group',
  'group-renamed': 'renamed the group',
  'member-invited': 'invited',
  'invitation-revoked': 'took back the invitation of',
  'member-joined': 'joined by the invitation to',
  'role-changed': 'changed the role of',
  'member-removed': 'removed',
  'member-left': 'left',
  'identity-kept': 'kept',
  'identity-revised': 'revised',
  'identity-checked': 'checked again',
  'identity-withdrawn': 'withdrew',
  'identity-shown': 'changed who can see',
  'token-made': 'made the token',
  'token-revoked': 'revoked the token',
} as const;

export type AuditAction = keyof typeof auditActions;
