/** Characters a password must have at least; its length is the only rule (NIST SP 800-63B, 5.1.1.2). */
export const shortestPassword = 10;
/** Longer ones are refused, so that hashing cannot be made expensive. */
export const longestPassword = 200;
