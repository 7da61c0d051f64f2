import type { Declined } from './ask';
import type { FaultSpans } from './editor/line-fault';
import type { Reading } from './reading';

/** A piece that could stand where the reading ended; `insert` is what a click writes, where it is known. */
export interface Expected {
  readonly text: string;
  readonly insert?: string;
}

/** What is wrong in the line, and where. */
export interface Fault {
  /** "Column 19." or "Line 2, column 5."; absent when the matter has no place in the line. */
  readonly place?: string;
  readonly message: string;
  readonly expected: readonly Expected[];
  /** Offset at which an expected piece is written. */
  readonly offset?: number;
  readonly spans?: FaultSpans;
  /** The matter is the field, not the line. */
  readonly ofField: boolean;
  /** The column before which everything was read. */
  readonly readTo?: string;
}

const placeName = (line: number, column: number): string =>
  line > 1 ? `Line ${line}, column ${column}.` : `Column ${column}.`;

/** A message after its place: the place is not said twice, and the sentence begins with a capital. */
function afterPlace(message: string): string {
  const rest = message.replace(/^(line \d+, ?)?column \d+[:.]?\s*/i, '');
  return rest.charAt(0).toUpperCase() + rest.slice(1);
}

/** Offset in UTF-16 units of a line and column, both from 1, columns in characters. */
export function offsetAt(text: string, line: number, column: number): number {
  let start = 0;
  for (let index = 1; index < line; index += 1) {
    const next = text.indexOf('\n', start);
    if (next < 0) return text.length;
    start = next + 1;
  }
  let offset = start;
  for (const character of Array.from(text.slice(start)).slice(0, column - 1)) offset += character.length;
  return offset;
}

function characterAt(text: string, offset: number): number {
  const code = text.codePointAt(offset);
  return code === undefined ? offset : offset + String.fromCodePoint(code).length;
}

/** The fault of a line that cannot be read. */
export function faultOfReading(reading: Reading | undefined): Fault | undefined {
  if (reading?.state !== 'unread') return undefined;
  const { error, text } = reading;
  const start = error.offset;
  const end = error.offending === '' ? start : Math.max(start + error.offending.length, characterAt(text, start));
  return {
    place: placeName(error.line, error.column),
    message: error.detail,
    expected: error.expected,
    offset: start,
    spans: { start, end, open: error.open },
    ofField: false,
    readTo: error.column > 1 ? `Not read past column ${error.column - 1}.` : 'Not read past the beginning.',
  };
}

/** The fault that the service found in a line that can be read: a zero entry, a letter the field does not have, the field itself. */
export function faultOfDeclined(declined: Declined | undefined, text: string): Fault | undefined {
  const problem = declined?.problem;
  if (!declined || !problem || problem.status !== 422) return undefined;
  if (problem.part === 'field') return { message: declined.message, expected: [], ofField: true };
  if (problem.column === undefined) return { message: declined.message, expected: [], ofField: false };
  const line = problem.line ?? 1;
  const start = offsetAt(text, line, problem.column);
  return {
    place: placeName(line, problem.column),
    message: afterPlace(declined.message),
    expected: (problem.expected ?? []).map((piece) => ({ text: piece })),
    offset: start,
    spans: { start, end: characterAt(text, start) },
    ofField: false,
  };
}
