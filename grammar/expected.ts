import { quoted } from './faults';
import type { Expected } from './reading-error';
import { type Situation, sourceOf } from './situation';
import type { BracketKind, Token } from './tokens';

/** The closing sign that belongs to an opening one, in the same spelling. */
export function closingOf(text: string, open: Token): string {
  const sign = text.slice(open.start, open.end).replace(/\s/g, '');
  const tex: Record<BracketKind, string> = {
    symbol: '\\rbrack',
    angle: '\\rangle',
    pfister: sign.startsWith('\\llangle') ? '\\rrangle' : '\\rangle\\!\\rangle',
    group: ')',
    brace: '}',
  };
  const plain: Record<string, string> = {
    '[': ']',
    '<': '>',
    '<<': '>>',
    '(': ')',
    '{': '}',
    '⟨': '⟩',
    '⟪': '⟫',
    '⟨⟨': '⟩⟩',
    '\u2329': '\u232A',
    '\u3008': '\u3009',
    '《': '》',
  };
  return plain[sign] ?? tex[open.bracket ?? 'group'];
}

const closeIt = (situation: Situation, open: Token): Expected => {
  const sign = closingOf(situation.text, open);
  return { text: `\`${sign}\` to close it`, insert: sign };
};

export const operation: Expected = { text: 'an operation such as `+` `*` `^`' };

/** What may follow an operand at the place. */
export function afterOperand(situation: Situation): readonly Expected[] {
  const innermost = situation.open.at(-1);
  if (!innermost) return [operation];
  const list: Expected[] = [closeIt(situation, innermost)];
  if (innermost.bracket !== 'group' && innermost.bracket !== 'brace')
    list.push({ text: '`,` and a further entry', insert: ', ' });
  return [...list, operation];
}

/** What may stand where an operand is missing. */
export function operand(situation: Situation): readonly Expected[] {
  if (situation.inEntry) return [{ text: 'a number' }, { text: 'a letter' }, { text: '`(`', insert: '(' }];
  return [
    { text: 'a bracket such as `[a]` or `<a>`' },
    { text: '`eta`', insert: 'eta' },
    { text: 'a number' },
    { text: '`(`', insert: '(' },
  ];
}

/** The text of a bracket from its opening sign to the place, for a sentence. */
export const openText = (situation: Situation, open: Token): string =>
  quoted(situation.text, { start: open.start, end: situation.offset });

/** The text of a token. */
export const spell = (situation: Situation, token: Token | undefined): string =>
  token ? sourceOf(situation, token) : '';
