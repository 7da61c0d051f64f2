import type { Span } from '@/engine/expression/span';

/** Where in a text something stands, as a person counts. */
export interface Location {
  /** From 1. */
  readonly line: number;
  /** In characters, from 1. */
  readonly column: number;
  /** The line and, under it, a line with carets below the stretch. */
  readonly excerpt: string;
}

/** Long lines are cut to about this many characters on each side of the stretch. */
const around = 60;

/** Line, column and excerpt of a stretch of a text. An offset past the end is taken as the end. */
export function locate(text: string, at: Span): Location {
  const start = Math.min(at.start, text.length);
  const before = text.slice(0, start).split(/\r\n|\r|\n/);
  const line = before.length;
  const prefix = [...(before[line - 1] ?? '')];
  const rest = [...(text.slice(start).split(/\r\n|\r|\n/, 1)[0] ?? '')];
  const length = Math.max(1, Math.min([...text.slice(start, at.end)].length, rest.length, around));
  const from = Math.max(0, prefix.length - around);
  const shown = (from > 0 ? '…' : '') + [...prefix.slice(from), ...rest.slice(0, length + around)].join('');
  const cut = rest.length > length + around ? '…' : '';
  const indent =
    (from > 0 ? ' ' : '') +
    prefix
      .slice(from)
      .map((character) => (character === '\t' ? '\t' : ' '))
      .join('');
  return { line, column: prefix.length + 1, excerpt: `${shown}${cut}\n${indent}${'^'.repeat(length)}` };
}
