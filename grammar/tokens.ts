/** What a piece of text is, as far as one can tell without reading the whole. */
export type TokenKind =
  | 'open' // an opening bracket
  | 'close' // a closing bracket
  | 'comma'
  | 'semicolon'
  | 'equals'
  | 'unequal'
  | 'sign' // + or a minus
  | 'times'
  | 'over'
  | 'hat'
  | 'underline'
  | 'number'
  | 'superscript'
  | 'letter' // inside an entry: one letter with its index; outside: Latin letters that are no word of the language
  | 'word' // eta, eps, h, and char in a hypothesis
  | 'fraction' // \frac
  | 'dressing' // $, \[, \begin{align*}: marks around the whole
  | 'command' // any other command of TeX
  | 'blank'
  | 'other';

export type BracketKind = 'symbol' | 'angle' | 'pfister' | 'group' | 'brace';

export interface Token {
  readonly kind: TokenKind;
  readonly start: number;
  readonly end: number;
  /** Of an opening or closing sign. */
  readonly bracket?: BracketKind;
  /** The token stands inside an entry of a symbol, an angle or a Pfister bracket, or in a hypothesis. */
  readonly inEntry: boolean;
}

const notLetter = '(?![a-zA-Z])';
/** In the order in which they are tried; every group is a kind, or a bracket with its side. */
const spelling: readonly (readonly [string, string])[] = [
  ['dressing', String.raw`\$\$?|\\[()]|\\\](?!\w)|\\\[(?!\w*(?:pt|em|ex|mm|cm)\])|\\(?:begin|end)\s*\{[a-z]*\*?\}`],
  ['blank', String.raw`\\\\(?:\[[\d.]+(?:pt|em|ex|mm|cm)\])?|\\[,!;:> ]|[\s~&\u200b\u2060-\u2064]+`],
  [
    'blank',
    String.raw`\\(?:left|right|middle|[bB]igg?[lr]?|q?quad|thinspace|nonumber|notag|displaystyle|textstyle)` +
      notLetter,
  ],
  ['open pfister', String.raw`<<|⟪|《|⟨\s*⟨|\\langle(?:\\[!,]|\s)*\\langle${notLetter}|\\llangle${notLetter}`],
  ['close pfister', String.raw`>>|⟫|》|⟩\s*⟩|\\rangle(?:\\[!,]|\s)*\\rangle${notLetter}|\\rrangle${notLetter}`],
  ['open angle', String.raw`[<⟨\u2329\u3008]|\\langle${notLetter}`],
  ['close angle', String.raw`[>⟩\u232A\u3009]|\\rangle${notLetter}`],
  ['open symbol', String.raw`\[|\\lbrack${notLetter}`],
  ['close symbol', String.raw`\]|\\rbrack${notLetter}`],
  ['open group', String.raw`\(`],
  ['close group', String.raw`\)`],
  ['open brace', String.raw`\{`],
  ['close brace', String.raw`\}`],
  ['comma', ','],
  ['semicolon', ';'],
  ['unequal', String.raw`!=|≠|\\neq?${notLetter}|\\not\s*=`],
  ['equals', '='],
  ['sign', '[+\\-−‐‑‒–—―﹣－]'],
  ['times', String.raw`[*·⋅×∗∙]|\\(?:cdot|times|ast)${notLetter}`],
  ['over', '[/∕⁄]'],
  ['hat', String.raw`\^`],
  ['underline', '_'],
  ['number', '[0-9]+'],
  ['superscript', '[⁻⁰¹²³⁴-⁹]+'],
  ['fraction', String.raw`\\[td]?frac${notLetter}`],
  ['word', String.raw`[ηεϵ𝜂𝜀𝜖]|\\(?:eta|varepsilon|epsilon)${notLetter}|\\(?:operatorname|mathrm)\s*\{\s*char\s*\}`],
  ['letter', String.raw`[a-zA-Z]['′’]*(?:[0-9]+|_[0-9]+|_\{[0-9]+\}|[₀-₉]+)?['′’]*`],
  ['command', String.raw`\\[a-zA-Z]+|\\.`],
  ['other', String.raw`[^]`],
];

const pattern = new RegExp(spelling.map(([, source]) => `(${source})`).join('|'), 'uy');
const outsideWord = /(?:eta|eps|h)|[a-zA-Z]+?(?=eta|eps|h|[^a-zA-Z]|$)/y;
const characteristic = /char(?![a-zA-Z])/y;

const isEntryBracket = (bracket: BracketKind): boolean =>
  bracket === 'symbol' || bracket === 'angle' || bracket === 'pfister';

/**
 * Cuts any text, readable or not, into pieces without gaps: for marking brackets and entries in an editor, and for saying
 * what is wrong. `inside` begins as in a field element or a hypothesis.
 */
export function tokenize(text: string, inside = false): readonly Token[] {
  const tokens: Token[] = [];
  const open: BracketKind[] = [];
  let hypotheses = inside;
  let at = 0;
  while (at < text.length) {
    const inEntry = hypotheses || open.some(isEntryBracket);
    const token = tokenAt(text, at, inEntry, open.at(-1));
    tokens.push(token);
    if (token.kind === 'open' && token.bracket) open.push(token.bracket);
    if (token.kind === 'close' && token.bracket === open.at(-1)) open.pop();
    if (token.kind === 'semicolon' && open.length === 0) hypotheses = true;
    at = token.end;
  }
  return tokens;
}

function tokenAt(text: string, start: number, inEntry: boolean, innermost: BracketKind | undefined): Token {
  const word = wordAt(text, start, inEntry);
  if (word) return word;
  pattern.lastIndex = start;
  const match = pattern.exec(text);
  const group = match ? match.slice(1).findIndex((part) => part !== undefined) : -1;
  const [kind, bracket] = (spelling[group]?.[0] ?? 'other').split(' ') as [TokenKind, BracketKind | undefined];
  const end = start + (match?.[0].length ?? 1);
  // Two closing angles end a Pfister bracket only where one is open.
  if (kind === 'close' && bracket === 'pfister' && innermost !== 'pfister' && text.startsWith('>>', start)) {
    return { kind, bracket: 'angle', start, end: start + 1, inEntry };
  }
  return bracket ? { kind, bracket, start, end, inEntry } : { kind, start, end, inEntry };
}

function wordAt(text: string, start: number, inEntry: boolean): Token | undefined {
  if (!/[a-zA-Z]/.test(text.charAt(start))) return undefined;
  const rule = inEntry ? characteristic : outsideWord;
  rule.lastIndex = start;
  const word = rule.exec(text)?.[0];
  if (word === undefined) return undefined;
  const known = inEntry || word === 'eta' || word === 'eps' || word === 'h';
  return { kind: known ? 'word' : 'letter', start, end: start + word.length, inEntry };
}

/** For every bracket the index of its partner; undefined for other tokens and where there is none. */
export function bracketPartners(tokens: readonly Token[]): readonly (number | undefined)[] {
  const partners: (number | undefined)[] = tokens.map(() => undefined);
  const open: number[] = [];
  tokens.forEach((token, i) => {
    if (token.kind === 'open') open.push(i);
    const last = open.at(-1);
    if (token.kind !== 'close' || last === undefined || tokens[last]?.bracket !== token.bracket) return;
    open.pop();
    partners[i] = last;
    partners[last] = i;
  });
  return partners;
}
