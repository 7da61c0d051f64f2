/** What a short name looks like: parts of small letters and digits, the first begins with a letter, each has one. */
const pattern = /^[a-z][a-z0-9]*(-[a-z0-9]*[a-z][a-z0-9]*)*$/;
export const longestSlug = 40;

/** Whether a text can be the short name of a group. The number of an identity after it can then be told from its parts. */
export const isSlug = (text: string): boolean => text.length <= longestSlug && pattern.test(text);

/** The short name a name suggests: "Séminaire Skerry 2" becomes "seminaire-skerry2". Empty when the name has no Latin letter. */
export function slugOf(name: string): string {
  const plain = name.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();
  let slug = '';
  for (const part of plain.match(/[a-z0-9]+/g) ?? []) {
    if (slug === '') slug = part.replace(/^[0-9]+/, '');
    // Digits alone would be read as the number of an identity.
    else slug += /[a-z]/.test(part) ? `-${part}` : part;
  }
  const cut = slug.slice(0, longestSlug).replace(/-[0-9]*$/, '');
  return isSlug(cut) ? cut : '';
}

/** Other short names, near a taken one, to be tried in this order. */
export function slugsNear(taken: string): readonly string[] {
  const stem = taken.slice(0, longestSlug - 3).replace(/-[0-9]*$/, '');
  const letters = [...'bcdefghijklmnopqrstuvwxyz'];
  const endings = [...letters, ...letters.flatMap((first) => ['a', ...letters].map((second) => first + second))];
  return endings.map((ending) => `${stem}-${ending}`);
}
