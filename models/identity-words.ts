/** The states of an identity. */
export const identityStates = ['draft', 'checked', 'withdrawn'] as const;
export type IdentityState = (typeof identityStates)[number];

/** Who can see an identity: its group, or anyone who has the link. */
export const visibilities = ['group', 'public'] as const;
export type Visibility = (typeof visibilities)[number];

/** What an identity says: that two expressions are equal, or what the residue of a class is. */
export const identityKinds = ['equality', 'residue'] as const;
export type IdentityKind = (typeof identityKinds)[number];

/** What a check found: a verdict, or that it was stopped at its budget, or that the engine does not decide this yet. */
export const checkVerdicts = ['equal', 'different', 'undecided', 'stopped', 'refused'] as const;
export type CheckVerdict = (typeof checkVerdicts)[number];
