/** Why something was not done: a sentence that says what to change, and the field it concerns if it concerns one. */
export interface Refused {
  readonly refused: string;
  readonly field?: string;
}

export const refuse = (refused: string, field?: string): Refused => ({ refused, field });

export const isRefused = (outcome: object): outcome is Refused => 'refused' in outcome;
