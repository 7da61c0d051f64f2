import fc from 'fast-check';
import type { Expression } from '@/engine/expression/expression';
import { readExpression } from '@/grammar/read';
import type { FieldRow } from './kmw-fields';

/** An equality in letters a, b, c, with {n} and {m} for integers. A new identity is one row. */
export interface Identity {
  readonly name: string;
  readonly left: string;
  readonly right: string;
  /** What the field must have: sums of entries as entries, and a second unit for 1 − a or a + b to be one. */
  readonly needs?: 'sums';
}

const row = (name: string, left: string, right: string, needs?: 'sums'): Identity => ({
  name,
  left,
  right,
  ...(needs && { needs }),
});

/**
 * The four relations of Milnor–Witt K-theory (F. Morel, A¹-Algebraic Topology over a Field, LNM 2052, Definition 3.1, number from
 * memory).
 */
export const relations: readonly Identity[] = [
  row('Steinberg relation', '[a][1-a]', '0', 'sums'),
  row('twisted additivity', '[ab]', '[a] + [b] + eta[a][b]'),
  row('eta commutes with symbols', 'eta[a]', '[a]eta'),
  row('eta kills the hyperbolic plane', 'eta*h', '0'),
];

/** What follows from them (F. Morel, LNM 2052, Lemmas 3.5–3.14, numbers from memory). */
export const identities: readonly Identity[] = [
  row('the symbol of one', '[1]', '0'),
  row('the form of one', '<1>', '1'),
  row('the definition of a form', '<a>', '1 + eta[a]'),
  row('the definition of epsilon', 'eps', '-<-1>'),
  row('the definition of the hyperbolic plane', 'h', '2 + eta[-1]'),
  row('the hyperbolic plane by epsilon', 'h', '1 - eps'),
  row('a Pfister form by a symbol', '<<a>>', '-eta[a]'),
  row('a product of Pfister forms', '<<a, b>>', '<<a>><<b>>'),
  row('forms are multiplicative', '<ab>', '<a><b>'),
  row('forms are central', '<a>[b]', '[b]<a>'),
  row('forms do not see squares', '<ab^2>', '<a>'),
  row('forms are involutions', '<a>^2', '1'),
  row('additivity twisted on the left', '[ab]', '[a] + <a>[b]'),
  row('additivity twisted on the right', '[ab]', '<b>[a] + [b]'),
  row('the symbol of an inverse', '[a^-1]', '-<a>[a]'),
  row('the symbol of a quotient', '[a/b]', '[a] - <a/b>[b]'),
  row('a and -a', '[a][-a]', '0'),
  row('a repeated entry, -1 on the right', '[a][a]', '[a][-1]'),
  row('a repeated entry, -1 on the left', '[a][a]', '[-1][a]'),
  row('epsilon-graded commutativity', '[a][b]', 'eps[b][a]'),
  row('commutativity next to eta', 'eta[a][b]', 'eta[b][a]'),
  row('the symbol of a square', '[a^2]', 'h[a]'),
  row('a square in a product', '[ab^2]', '[a] + <a>h[b]'),
  row('a square in a product, without a twist', '[ab^2]', '[a] + h[b]'),
  row('the symbol of a power', '[a^({n})]', '({n})_eps[a]'),
  row('the hyperbolic plane kills [-1]', 'h[-1]', '0'),
  row('[-1] twice next to eta', 'eta[-1]^2', '-2[-1]'),
  row('eta twice next to [-1]', 'eta^2[-1]', '-2eta'),
  row('epsilon fixes eta', 'eps*eta', 'eta'),
  row('the hyperbolic plane absorbs forms', '<a>h', 'h'),
  row('the square of the hyperbolic plane', 'h^2', '2h'),
  row('epsilon fixes [-1]', 'eps[-1]', '[-1]'),
  row('epsilon is an involution', 'eps^2', '1'),
  row('a and -a make a hyperbolic plane', '<a> + <-a>', 'h'),
  row('the Witt relation', '<a> + <b>', '<a+b> + <ab(a+b)>', 'sums'),
  row('epsilon integers are multiplicative', '({n})_eps({m})_eps', '({nm})_eps'),
  row('eta times an odd epsilon integer', 'eta*({odd})_eps', 'eta'),
  row('eta times an even epsilon integer', 'eta*({even})_eps', '0'),
  row('an even epsilon integer', '({even})_eps', '{half}h'),
  row('a negative epsilon integer', '({minus})_eps', '-<-1>({n})_eps'),
  row('a square on the left of h', '[a]h[b]', '[a^2][b]'),
  row('a square on the right of h', '[a]h[b]', '[a][b^2]'),
  row('Steinberg with a square', '[a^2][1-a]', '0', 'sums'),
  row('Steinberg for a quotient', '[a][1-1/a]', '[a][-1]*0', 'sums'),
  row('the Steinberg pair of a sum', '[a/(a+b)][b/(a+b)]', '0', 'sums'),
];

/** An equality that fails in general, and when it holds all the same. */
export interface NearMiss extends Identity {
  /** `square`: where −1 is a square in every field of the characteristic. `one`: where −1 = 1. */
  readonly holds: 'never' | 'square' | 'one';
}

const miss = (name: string, left: string, right: string, holds: NearMiss['holds']): NearMiss => ({
  ...row(name, left, right),
  holds,
});

export const nearMisses: readonly NearMiss[] = [
  miss('additivity without a twist', '[ab]', '[a] + [b]', 'never'),
  miss('graded commutativity without epsilon', '[a][b]', '-[b][a]', 'square'),
  miss('h kills every symbol', 'h[a]', '0', 'never'),
  miss('the symbol of an inverse without a twist', '[a^-1]', '-[a]', 'square'),
  miss('the symbol of a square without epsilon', '[a^2]', '2[a]', 'square'),
  miss('every form is trivial', '<a>', '1', 'never'),
  miss('epsilon negates eta', 'eta*eps', '-eta', 'square'),
  miss('the epsilon integer two is two', '2_eps', '2', 'square'),
  miss('a repeated entry vanishes', '[a][a]', '0', 'one'),
  miss('a sum of forms by their product', '<a> + <b>', '<ab> + 1', 'never'),
];

/** The integers of a row, drawn at once. */
export interface Integers {
  readonly n: number;
  readonly m: number;
}

export const integers: fc.Arbitrary<Integers> = fc.record({
  n: fc.integer({ min: -9, max: 9 }),
  m: fc.integer({ min: -9, max: 9 }),
});

const trees = new Map<string, Expression>();

/** A side of a row as a tree, with its integers put in. */
export function sideOf(text: string, { n, m }: Integers): Expression {
  const half = Math.abs(n);
  const filled = text
    .replaceAll('{nm}', `${n * m}`)
    .replaceAll('{n}', `${n}`)
    .replaceAll('{m}', `${m}`)
    .replaceAll('{minus}', `${-n}`)
    .replaceAll('{odd}', `${2 * n + 1}`)
    .replaceAll('{even}', `${2 * half}`)
    .replaceAll('{half}', `${half}`);
  const made = trees.get(filled) ?? readExpression(filled);
  trees.set(filled, made);
  return made;
}

/** Whether a row can be asked over a field. */
export const fits = (identity: Identity, field: FieldRow): boolean =>
  identity.needs !== 'sums' || (field.sums && field.steinberg);
