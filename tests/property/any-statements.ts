import { identities, nearMisses, relations } from './kmw-identities';

/** A statement about every field, as it is typed. */
export interface Claim {
  readonly name: string;
  readonly left: string;
  readonly right: string;
}

const claim = (name: string, left: string, right: string): Claim => ({ name, left, right });

/** Equalities in K^MW of every field whose proof needs Steinberg relations among sums of letters. */
export const theorems: readonly Claim[] = [
  claim('the Witt relation', '<a> + <b>', '<a+b> + <ab(a+b)>'),
  claim('the Witt relation with squares', '<a> + <b>', '<ax^2+by^2> + <ab(ax^2+by^2)>'),
  claim('reduction next to [p]', '[p][x]', '[p][x+kp] + <x+kp>[(x+kp)/k][x/(x+kp)]'),
  claim('[-a] next to [1 + a]', '[a][1+a]', '[-1][1+a]'),
  claim('h times a Steinberg relation', 'h[a][1-a]', '0'),
  claim('the Steinberg relation of a square', '[a^2][1-a^2]', '0'),
  claim('a Pfister form and the factor 1 - a', '<<a, b>>', '<<a, (1-a)b>>'),
  claim('a Pfister form of a sum', '<<a, b>>', '<<a+b, -ab>>'),
  claim('a symbol of a sum', '[a][b]', '[a+b][-b/a]'),
  claim('the Steinberg pair of a sum', '[x/(x+y)][y/(x+y)]', '0'),
  claim('h and 1 + a', 'h[a][1+a]', '0'),
  claim('the inverse in the Steinberg relation', '[a][1-1/a]', '0'),
  claim('a cube in the Steinberg relation', '[a^3][1-a^3]', '0'),
  claim('three summands', '[a/(a+b+c)][(b+c)/(a+b+c)]', '0'),
  claim('two Steinberg relations at once', '<<a, b, (1-a)(1-b)>>', '0'),
  claim('a square in a Pfister form', '<<a>><<x^2-a*y^2>>', '0'),
  claim('a norm from a quadratic extension', 'eta[-3][a^2+ab+b^2]', '0'),
  claim('a sum of two squares', 'eta[-1][a^2+b^2]', '0'),
  claim('a sum of four squares', '<<-1, -1>><1+a^2+b^2+c^2>', '<<-1, -1>>'),
  claim('constants beside letters', '[2][a][-1][1-b]', '0'),
];

/** The identities that hold in every ring of this kind, at sums of letters. */
export const identitiesInLetters: readonly Claim[] = [...relations, ...identities].filter(
  ({ left, right }) => !`${left}${right}`.includes('{'),
);

/** Statements that fail for some field, most of them one sign or one letter away from an equality. */
export const falsehoods: readonly Claim[] = [
  ...nearMisses,
  claim('a symbol of a sum, a for 1/a', '[a][b]', '[a+b][-ab]'),
  claim('a symbol of a sum, without the sign', '[a][b]', '[a+b][b/a]'),
  claim('a symbol of a sum, turned round', '[a][b]', '[-b/a][a+b]'),
  claim('a symbol of a difference', '[a][b]', '[a-b][-b/a]'),
  claim('the Witt relation, a sign', '<a> + <b>', '<a+b> + <-ab(a+b)>'),
  claim('the Witt relation of a difference', '<a> + <b>', '<a-b> + <ab(a-b)>'),
  claim('the Witt relation, the product alone', '<a> + <b>', '<a+b> + <ab>'),
  claim('reduction next to [p], a sign', '[p][x]', '[p][x+kp] - <x+kp>[(x+kp)/k][x/(x+kp)]'),
  claim('reduction next to [p], another sign', '[p][x]', '[p][x-kp] + <x+kp>[(x+kp)/k][x/(x+kp)]'),
  claim('reduction next to [p], without the form', '[p][x]', '[p][x+kp] + [(x+kp)/k][x/(x+kp)]'),
  claim('[a] next to [1 + a], a sign', '[a][1+a]', '-[-1][1+a]'),
  claim('[a] next to [1 + a]', '[a][1+a]', '0'),
  claim('[a] next to [1 - a^2], half a square', '[a][1-a^2]', '0'),
  claim('a Pfister form and the factor 1 + a', '<<a, b>>', '<<a, (1+a)b>>'),
  claim('a Pfister form of a sum, a sign', '<<a, b>>', '<<a+b, ab>>'),
  claim('the Steinberg pair of a sum, a sign', '[x/(x+y)][-y/(x+y)]', '0'),
  claim('the Steinberg pair of a difference', '[x/(x-y)][y/(x-y)]', '0'),
  claim('three symbols turned round beside a sum', '[a][b][c][1+d]', '[b][a][c][1+d]'),
  claim('a norm from another quadratic extension', 'eta[3][a^2+ab+b^2]', '0'),
  claim('a norm, not modulo h', '[-3][a^2+ab+b^2]', '0'),
  claim('a sum of three squares as one of two', 'eta[-1][1+a^2+b^2]', '0'),
  claim('a Pfister form of sums', '<<a+b, c>>', '<<a, c>> + <<b, c>>'),
  claim('a symbol is additive in sums', '[a+b]', '[a] + [b]'),
  claim('a constant beside letters', '[3][a][-1][1-b]', '0'),
];

/** The statements that come from an equality by one sign: + for −, − for +, a − left out, or one put before an entry. */
export function variations({ name, left, right }: Claim): readonly Claim[] {
  const text = `${left} = ${right}`;
  const texts = [...text].flatMap((character, i) => {
    const put = (sign: string): string => text.slice(0, i) + sign + text.slice(i + 1);
    if (character === '+') return [put('-')];
    if (character === '-') return [put('+'), ...(/[a-z0-9]/.test(text[i - 1] ?? '') ? [] : [put('')])];
    const opens = ['[', '<', ','].includes(character) && !['<', '-', ' '].includes(text[i + 1] ?? '');
    return opens ? [put(`${character}-`)] : [];
  });
  return [...new Set(texts)].map((varied) => {
    const [l = '', r = ''] = varied.split(' = ');
    return { name: `${name}: ${varied}`, left: l, right: r };
  });
}
