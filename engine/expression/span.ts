/** A stretch of the text a node was read from: offsets in UTF-16 units, `end` excluded. */
export interface Span {
  readonly start: number;
  readonly end: number;
}
