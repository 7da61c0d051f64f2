const marks: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** A text in HTML, between tags or inside of a quoted attribute. */
export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (mark) => marks[mark] ?? mark);

/** Controls, and the invisible marks that change the direction of what follows. */
const unseen = /[\p{Cc}\p{Zl}\p{Zp}\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069]+/gu;

/** A name or a subject as one line of at most so many letters: no line in it can begin a header or a paragraph of its own. */
export function oneLine(text: string, most = 120): string {
  const letters = [...text.replace(unseen, ' ').replace(/\s+/g, ' ').trim()];
  return letters.length <= most ? letters.join('') : `${letters.slice(0, most - 1).join('')}…`;
}

/** Breaks a paragraph into lines of at most 72 letters; a longer word stays whole. */
export function wrap(paragraph: string): string {
  const lines: string[] = [];
  let line = '';
  for (const word of paragraph.split(' ')) {
    if (line !== '' && line.length + 1 + word.length > 72) {
      lines.push(line);
      line = word;
    } else line = line === '' ? word : `${line} ${word}`;
  }
  return [...lines, line].join('\n');
}

const moment = new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeStyle: 'short', timeZone: 'UTC' });

/** A moment in words, as in "1 March 2027 at 14:05 UTC". */
export const inWords = (date: Date): string => `${moment.format(date)} UTC`;
