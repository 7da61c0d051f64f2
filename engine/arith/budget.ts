/**
 * What a long computation may spend. The engine reads no clock: it calls `spend` regularly and the caller, who has a clock,
 * ends the computation by throwing. `doing` names the work for the message a person gets ("factoring …").
 */
export interface Budget {
  spend(doing: string): void;
}

/** For callers with nothing to bound, such as tests on small input. */
export const unlimited: Budget = { spend: () => undefined };
