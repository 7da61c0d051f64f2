import { tokenize } from '@/grammar/tokens';

/** A stretch of a text: in both versions, only in the earlier, or only in the later. */
export interface Piece {
  readonly kind: 'both' | 'gone' | 'new';
  readonly text: string;
}

export interface Difference {
  /** The earlier text, with what is gone from it. */
  readonly before: readonly Piece[];
  /** The later text, with what is new in it. */
  readonly after: readonly Piece[];
}

/** Past this many pairs of words the middle is marked as a whole: finding what it has in common would take too long. */
const mostPairs = 1_000_000;

/** The words of a statement: its signs and factors, a bracket with all that stands in it as one, each with the blanks behind it. */
function statementWords(text: string): string[] {
  const words: string[] = [];
  let begin = 0;
  let depth = 0;
  for (const { kind, start, end } of tokenize(text)) {
    if (kind === 'open' && depth === 0) begin = start;
    if (kind === 'open') depth += 1;
    else if (kind === 'close' && depth > 0) {
      depth -= 1;
      if (depth === 0) words.push(text.slice(begin, end));
    } else if (depth === 0) words.push(text.slice(start, end));
  }
  if (depth > 0) words.push(text.slice(begin));
  return withBlanks(words);
}

/** The words of prose, each with the blanks behind it. */
const proseWords = (text: string): string[] => text.match(/\s*\S+\s*/g) ?? [];

function withBlanks(tokens: readonly string[]): string[] {
  const words: string[] = [];
  for (const token of tokens) {
    const last = words.length - 1;
    if (last >= 0 && token.trim() === '') words[last] += token;
    else words.push(token);
  }
  return words;
}

const same = (a: string | undefined, b: string | undefined): boolean => a?.trim() === b?.trim();

/** Word by word, what a revision took away and what it added; `kind` says what the words are. */
export function differenceOf(before: string, after: string, kind: 'statement' | 'prose' = 'statement'): Difference {
  const words = kind === 'statement' ? statementWords : proseWords;
  const a = words(before);
  const b = words(after);
  let head = 0;
  while (head < a.length && head < b.length && same(a[head], b[head])) head += 1;
  let tail = 0;
  while (tail < a.length - head && tail < b.length - head && same(a.at(-1 - tail), b.at(-1 - tail))) tail += 1;
  const middleA = a.slice(head, a.length - tail);
  const middleB = b.slice(head, b.length - tail);
  const [keptA, keptB] = common(middleA, middleB);
  const marked = (all: readonly string[], kept: ReadonlySet<number>, otherwise: 'gone' | 'new') =>
    joined(
      all.map((text, index) => ({
        kind: index < head || index >= all.length - tail || kept.has(index - head) ? 'both' : otherwise,
        text,
      })),
    );
  return { before: marked(a, keptA, 'gone'), after: marked(b, keptB, 'new') };
}

/** Neighbouring pieces of one kind become one. */
function joined(pieces: readonly Piece[]): Piece[] {
  const out: Piece[] = [];
  for (const piece of pieces) {
    const last = out.at(-1);
    if (last?.kind === piece.kind) out[out.length - 1] = { kind: last.kind, text: last.text + piece.text };
    else out.push(piece);
  }
  return out;
}

/** The places, in both lists, of a longest common subsequence. */
function common(a: readonly string[], b: readonly string[]): [ReadonlySet<number>, ReadonlySet<number>] {
  const keptA = new Set<number>();
  const keptB = new Set<number>();
  if (a.length * b.length > mostPairs) return [keptA, keptB];
  const width = b.length + 1;
  const longest = new Uint16Array((a.length + 1) * width);
  const at = (i: number, j: number): number => longest[i * width + j] ?? 0;
  for (let i = a.length - 1; i >= 0; i -= 1)
    for (let j = b.length - 1; j >= 0; j -= 1)
      longest[i * width + j] = same(a[i], b[j]) ? at(i + 1, j + 1) + 1 : Math.max(at(i + 1, j), at(i, j + 1));
  for (let i = 0, j = 0; i < a.length && j < b.length;) {
    if (same(a[i], b[j])) {
      keptA.add(i);
      keptB.add(j);
      i += 1;
      j += 1;
    } else if (at(i + 1, j) >= at(i, j + 1)) i += 1;
    else j += 1;
  }
  return [keptA, keptB];
}
