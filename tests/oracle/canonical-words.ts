import type { Element } from '@/engine/expression/element';
import type { Expression } from '@/engine/expression/expression';
import { exponentIn, primesOf, valueOf } from './fraction';
import { freeWords } from './free-words';

/** A generator: −1, a letter, or a prime written out. */
export type Generator = string;

/** ± a product of powers of generators. */
export interface Monomial {
  readonly negative: boolean;
  readonly exponents: ReadonlyMap<Generator, number>;
}

/** Coefficients of canonical words, by a key `eta|k|generators`: η^eta [−1]^k [p_S]. Zero coefficients are left out. */
export type CanonicalWords = ReadonlyMap<string, bigint>;

/**
 * Expands an expression into canonical words by rewriting one step at a time (F. Morel, LNM 2052, ch. 3): [ab] = [a] + [b] + η[a][b],
 * [a⁻¹] = −[a] − η[a][a], [b][a] = −[a][b] − η[−1][a][b], [a][−1] = [−1][a], [a][a] = [−1][a], η[−1]² = −2[−1], η²[−1] = −2η.
 * `characteristic` is 0 or a prime: then [−1] and η also satisfy what they satisfy in K^MW of the prime field.
 */
export function canonicalWords(
  expression: Expression,
  read: (entry: Element) => Monomial,
  characteristic: bigint,
): CanonicalWords {
  const words = freeWords(expression, read, { negative: true, exponents: new Map() }).flatMap((word) =>
    word.entries.reduce<readonly Arranged[]>(
      (product, entry) => settled(product.flatMap((x) => symbolWords(entry).map((y) => joined(x, y)))),
      settled([{ coefficient: word.coefficient, eta: word.eta, minus: 0, letters: [] }]),
    ),
  );
  const total = new Map(settled(words).map((word) => [keyOf(word), word.coefficient]));
  return reduced(total, characteristic);
}

/** coefficient · η^eta [−1]^minus [letters in any order]: [−1] commutes with symbols. */
interface Arranged {
  readonly coefficient: bigint;
  readonly eta: number;
  readonly minus: number;
  readonly letters: readonly Generator[];
}

const keyOf = ({ eta, minus, letters }: Arranged): string => `${eta}|${minus}|${letters.join(',')}`;

const joined = (x: Arranged, y: Arranged, etas = 0): Arranged => ({
  coefficient: x.coefficient * y.coefficient,
  eta: x.eta + y.eta + etas,
  minus: x.minus + y.minus,
  letters: [...x.letters, ...y.letters],
});

/** [±∏ generatorᵉ] in canonical words, one generator after another. */
function symbolWords({ negative, exponents }: Monomial): readonly Arranged[] {
  const symbol = { coefficient: 1n, eta: 0, minus: 0, letters: [] };
  const inverse = (g: Generator): readonly Arranged[] => [
    { ...symbol, coefficient: -1n, letters: [g] },
    { ...symbol, coefficient: -1n, eta: 1, letters: [g, g] },
  ];
  const parts: (readonly Arranged[])[] = negative ? [[{ ...symbol, minus: 1 }]] : [];
  for (const [g, e] of exponents)
    for (let i = 0; i < Math.abs(e); i += 1) parts.push(e > 0 ? [{ ...symbol, letters: [g] }] : inverse(g));
  return parts.reduce((a, b) => settled([...a, ...b, ...a.flatMap((x) => b.map((y) => joined(x, y, 1)))]), []);
}

/** Numbers by size, then letters by name. */
function precedes(a: Generator, b: Generator): boolean {
  const [m, n] = [Number(a), Number(b)];
  if (Number.isNaN(m) || Number.isNaN(n)) return Number.isNaN(m) === Number.isNaN(n) ? a < b : Number.isNaN(n);
  return m < n;
}

/** Rewrites words until they are canonical, like words collected after every step. */
function settled(words: readonly Arranged[]): readonly Arranged[] {
  let current = words;
  for (;;) {
    const next = new Map<string, Arranged>();
    let changed = false;
    for (const word of current) {
      const written = step(word);
      changed ||= written[0] !== word;
      for (const piece of written) {
        const key = keyOf(piece);
        next.set(key, { ...piece, coefficient: piece.coefficient + (next.get(key)?.coefficient ?? 0n) });
      }
    }
    current = [...next.values()].filter(({ coefficient }) => coefficient !== 0n);
    if (!changed) return current;
  }
}

/** One rewriting, or the word itself where none applies. */
function step(word: Arranged): readonly Arranged[] {
  const { coefficient, eta, minus, letters } = word;
  if ((eta >= 1 && minus >= 2) || (eta >= 2 && minus === 1))
    return [{ coefficient: -2n * coefficient, eta: eta - 1, minus: minus - 1, letters }];
  for (let i = 0; i + 1 < letters.length; i += 1) {
    const [a, b] = [letters[i] ?? '', letters[i + 1] ?? ''];
    const around = (middle: readonly Generator[]): Generator[] => [
      ...letters.slice(0, i),
      ...middle,
      ...letters.slice(i + 2),
    ];
    if (a === b) return [{ coefficient, eta, minus: minus + 1, letters: around([a]) }];
    if (!precedes(b, a)) continue;
    const sorted = around([b, a]);
    return [
      { coefficient: -coefficient, eta, minus, letters: sorted },
      { coefficient: -coefficient, eta: eta + 1, minus: minus + 1, letters: sorted },
    ];
  }
  return [word];
}

/** Coefficients modulo what [−1] and η satisfy in the prime field: W(𝔽_p), and 𝔽_p^× cut down to ±1. */
function reduced(words: CanonicalWords, p: bigint): CanonicalWords {
  const result = new Map<string, bigint>();
  for (const [key, c] of words) {
    const [eta = 0, k = 0] = key.split('|').slice(0, 2).map(Number);
    const order = p === 0n ? undefined : orderOf(eta, k, p);
    const value = order === undefined ? c : ((c % order) + order) % order;
    if (value !== 0n) result.set(key, value);
  }
  return result;
}

/** The order of η^eta [−1]^k over 𝔽_p, `undefined` for infinite. */
function orderOf(eta: number, k: number, p: bigint): bigint | undefined {
  const minusOneIsSquare = p % 4n !== 3n;
  if (eta === 0 && k === 0) return undefined;
  if (k === 0) return minusOneIsSquare ? 2n : 4n; // ηᵐ: ⟨1⟩ in W(𝔽_p)
  if (eta > 0) return minusOneIsSquare ? 1n : 2n; // η[−1] = ⟨−1⟩ − 1
  return k === 1 && p !== 2n ? 2n : 1n; // K^MW_2(𝔽_p) = 0
}

/** A rational entry as ± a product of powers of primes. */
export function primeMonomial(entry: Element): Monomial {
  const { num, den } = valueOf(entry);
  const exponents = new Map<Generator, number>();
  for (const p of [...primesOf(num), ...primesOf(den)].sort((a, b) => (a < b ? -1 : 1)))
    exponents.set(p.toString(), exponentIn(num, p) - exponentIn(den, p));
  return { negative: num < 0n, exponents };
}

/** Canonical words as text. */
export function writeWords(words: CanonicalWords): string {
  const terms = [...words].map(([key, c]) => {
    const [eta = '0', k = '0', generators = ''] = key.split('|');
    const symbols = generators === '' ? '' : `*[${generators}]`;
    return `${c < 0n ? '-' : '+'} ${c < 0n ? -c : c}*eta^${eta}*[-1]^${k}${symbols}`;
  });
  return terms.length === 0 ? '0' : `0 ${terms.join(' ')}`;
}
