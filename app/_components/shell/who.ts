/** Who reads the page, as the running head says it. */
export interface Who {
  readonly person?: string;
  readonly group?: string;
}
