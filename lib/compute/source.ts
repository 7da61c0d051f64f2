import type { Span } from '@/engine/expression/span';

/** A text of the request with the tree that was read from it, kept to say where a refusal points. */
export interface Source {
  /** The key of the request, such as `left` or `hypotheses[0]`. */
  readonly part: string;
  readonly text: string;
  readonly tree: unknown;
}

/**
 * The text a refusal's stretch belongs to. A stretch carries offsets only; but it is the very object of the node that was
 * refused, so the tree that holds the object is the one. Undefined when no tree does and more than one could.
 */
export function sourceOf(at: Span, sources: readonly Source[]): Source | undefined {
  const holding = sources.find((source) => holds(source.tree, (span) => span === at));
  if (holding !== undefined) return holding;
  const alike = sources.filter((source) =>
    holds(source.tree, (span) => span.start === at.start && span.end === at.end),
  );
  return alike.length === 1 ? alike[0] : undefined;
}

function holds(tree: unknown, wanted: (span: Span) => boolean): boolean {
  if (typeof tree !== 'object' || tree === null) return false;
  if (Array.isArray(tree)) return tree.some((member) => holds(member, wanted));
  return Object.entries(tree).some(([key, value]) =>
    key === 'at' ? isSpan(value) && wanted(value) : holds(value, wanted),
  );
}

const isSpan = (value: unknown): value is Span =>
  typeof value === 'object' && value !== null && 'start' in value && 'end' in value;
