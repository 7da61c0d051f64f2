/** Live tokens a person may have in a group. */
export const mostTokens = 50;

/** Characters the name of a token may have. */
export const longestTokenName = 80;

/** Days a token may last: at least a day, at most a year. */
export const shortestLife = 1;
export const longestLife = 366;
