import type { Span } from '../engine/expression/span';
import type { Expected } from './reading-error';
import { type BracketKind, bracketPartners, type Token, tokenize } from './tokens';

/** What a text is read as. */
export type Reading = 'expression' | 'statement' | 'element' | 'condition' | 'field';

/** The place where reading stopped, with all that is needed to say what is wrong. */
export interface Situation {
  readonly text: string;
  readonly reading: Reading;
  /** Where the error is shown. */
  readonly offset: number;
  /** The token that does not fit; undefined at the end of the text. */
  readonly here: Token | undefined;
  /** The tokens before it without blanks, last first. */
  readonly before: readonly Token[];
  /** Brackets open there, outermost first. */
  readonly open: readonly Token[];
  /** The place is inside an entry, a hypothesis or a field element. */
  readonly inEntry: boolean;
  /** An operand stands right before, so that an operation or the end is expected. */
  readonly complete: boolean;
  /** How the place is named in a sentence: "where ] stands", "where the text ends". */
  readonly where: string;
}

/** What is wrong, in words, and what could stand there. */
export interface Finding {
  readonly detail: string;
  readonly expected: readonly Expected[];
  readonly open?: Span;
  /** Where another place than the situation's is meant. */
  readonly offset?: number;
  readonly offending?: string;
}

export const sourceOf = (situation: Situation, at: Span): string => situation.text.slice(at.start, at.end);

const operandKinds = new Set(['number', 'letter', 'word', 'close', 'superscript']);

/** Looks at the place `offset` of a text, where the grammar gave up. */
export function situationAt(text: string, offset: number, reading: Reading): Situation {
  const tokens = tokenize(text, reading === 'element' || reading === 'condition');
  let index = tokens.findIndex((token) => token.end > offset);
  while (index >= 0 && tokens[index]?.kind === 'blank' && !isRowBreak(text, tokens[index])) {
    index = index + 1 < tokens.length ? index + 1 : -1;
  }
  const here = index >= 0 ? tokens[index] : undefined;
  const prior = index >= 0 ? tokens.slice(0, index) : tokens;
  const partners = bracketPartners(prior);
  const before = prior.filter((token) => token.kind !== 'blank').reverse();
  const open = prior.filter((token, i) => token.kind === 'open' && partners[i] === undefined);
  const [last] = before;
  const start = here ? here.start : (last?.end ?? 0);
  return {
    text,
    reading,
    offset: start,
    here,
    before,
    open,
    inEntry: here ? here.inEntry : endsInEntry(tokens, open, reading),
    complete: last !== undefined && operandKinds.has(last.kind),
    where: here ? `where ${text.slice(here.start, here.end)} stands` : 'where the text ends',
  };
}

const isRowBreak = (text: string, token: Token | undefined): boolean =>
  token !== undefined && text.startsWith('\\\\', token.start);

const entryBrackets = new Set<BracketKind>(['symbol', 'angle', 'pfister']);

function endsInEntry(tokens: readonly Token[], open: readonly Token[], reading: Reading): boolean {
  if (reading === 'element' || reading === 'condition') return true;
  if (open.some((token) => token.bracket !== undefined && entryBrackets.has(token.bracket))) return true;
  return tokens.at(-1)?.inEntry === true && tokens.some((token) => token.kind === 'semicolon');
}
