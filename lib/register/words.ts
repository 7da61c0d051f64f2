/** Longer words are looked up by their beginning. */
const longestWord = 60;

/**
 * The words of any text, in small letters and without accents: runs of letters and digits. Whatever stands between them,
 * brackets and operators of the search language included, separates and means nothing.
 */
const wordsOf = (text: string): string[] =>
  (
    text
      .normalize('NFKD')
      .replace(/\p{M}/gu, '')
      .toLowerCase()
      .match(/[\p{L}\p{N}]+/gu) ?? []
  ).map((word) => [...word].slice(0, longestWord).join(''));

/** A text as the register keeps it to be searched: its words, and nothing else. */
export const searchable = (text: string): string => wordsOf(text).join(' ');

/** A query for texts in which every one of these words occurs, or one it begins; undefined when there is no word. */
export function searchQuery(text: string): string | undefined {
  const words = [...new Set(wordsOf(text))];
  return words.length === 0 ? undefined : words.map((word) => `${word}:*`).join(' & ');
}
