/** A bracket of the language as it is spelt in the line. */
export interface Bracket {
  readonly kind: 'square' | 'angle' | 'pfister' | 'round';
  readonly opens: boolean;
  readonly start: number;
  readonly end: number;
}

const spelling =
  /(?<square>\[|\\lbrack(?![a-zA-Z]))|(?<squareEnd>\]|\\rbrack(?![a-zA-Z]))|(?<pfister><<|⟪|\\langle(?:\\!)?\\langle(?![a-zA-Z]))|(?<pfisterEnd>>>|⟫|\\rangle(?:\\!)?\\rangle(?![a-zA-Z]))|(?<angle><|⟨|\\langle(?![a-zA-Z]))|(?<angleEnd>>|⟩|\\rangle(?![a-zA-Z]))|(?<round>\()|(?<roundEnd>\))/gu;

/** Every bracket of a text, readable or not, in order. */
export function bracketsIn(text: string): Bracket[] {
  const found: Bracket[] = [];
  for (const match of text.matchAll(spelling)) {
    const name = Object.entries(match.groups ?? {}).find(([, part]) => part !== undefined)?.[0] ?? '';
    const kind = name.replace('End', '') as Bracket['kind'];
    found.push({ kind, opens: !name.endsWith('End'), start: match.index, end: match.index + match[0].length });
  }
  return found;
}

/** The partner of each bracket, by position in the list; undefined where there is none. */
export function partners(brackets: readonly Bracket[]): (number | undefined)[] {
  const pairs: (number | undefined)[] = brackets.map(() => undefined);
  const open: number[] = [];
  brackets.forEach((bracket, index) => {
    if (bracket.opens) {
      open.push(index);
      return;
    }
    const last = open.at(-1);
    if (last === undefined || brackets[last]?.kind !== bracket.kind) return;
    open.pop();
    pairs[index] = last;
    pairs[last] = index;
  });
  return pairs;
}
