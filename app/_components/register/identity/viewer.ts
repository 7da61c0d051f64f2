/** What whoever reads an identity may do with it. */
export interface Viewer {
  /** It is one of the reader's own group. */
  readonly own: boolean;
  /** May revise, check and withdraw it, and change who sees it. */
  readonly mayWrite: boolean;
}
