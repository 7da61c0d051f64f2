import type { IdentityAnswer } from './identity-answer';
import type { IdentityForm } from './identity-draft';

/** What became of a form for an identity that was sent and not kept. */
export interface IdentityOutcome {
  /** A sentence for each field that has to change. */
  readonly errors?: Partial<Readonly<Record<keyof IdentityForm, string>>>;
  /** What stands in the way and concerns no single field. */
  readonly fault?: string;
  /** Someone else revised it meanwhile: the identity as it is now. */
  readonly conflict?: IdentityAnswer;
}
