/** What an action says of a form that was sent. */
export interface FormState {
  /** A sentence for each field that has to change, by the name of the field. */
  readonly errors?: Readonly<Record<string, string>>;
  /** What stands in the way and concerns no single field. */
  readonly fault?: string;
  /** What was done. */
  readonly done?: string;
}

/** A form that has not been sent yet. */
export const unsent: FormState = {};

/** What an action of the server that a form is sent to looks like. */
export type FormAction = (before: FormState, form: FormData) => Promise<FormState>;
