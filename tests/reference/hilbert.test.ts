import { describe, expect, it } from 'vitest';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { primesOf } from '../oracle/fraction';
import { hilbert } from '../oracle/symbols';
import { verdict } from '../property/kmw-engine';
import { gpLines, gpVector } from './arith-gp';

const stream = seeded(1736);
const random = (low: bigint, high: bigint): bigint => randomBetween(low, high, stream);

/** A random non-zero integer with a random power of p in it. */
function entry(p: bigint, size: bigint): bigint {
  let n = 0n;
  while (n === 0n) n = random(-size, size);
  return n * p ** random(0n, 3n);
}

const entryText = (n: bigint): string => `(${n})`;

/** The symbol at a place as the engine sees it: ⟪a, b⟫ = η²[a][b] is hyperbolic iff (a, b) = 1. */
const byForms = (field: string, a: bigint, b: bigint): 1 | -1 =>
  verdict(field, `<<${entryText(a)}, ${entryText(b)}>>`, '0') === 'equal' ? 1 : -1;

const places: readonly (readonly [name: string, p: bigint, field: string, pairs: number, size: bigint])[] = [
  ['2', 2n, 'Q_2', 1500, 400n],
  ['3', 3n, 'Q_3', 400, 400n],
  ['5', 5n, 'Q_5', 300, 400n],
  ['7', 7n, 'Q_7', 300, 400n],
  ['101', 101n, 'Q_101', 200, 10_000n],
  ['1000003', 1_000_003n, 'Q_1000003', 200, 10n ** 12n],
  ['the real place', 0n, 'R', 300, 400n],
];

/**
 * Hilbert symbols by the engine, by the formulas of J.-P. Serre, A Course in Arithmetic, III.1.2, Theorem 1 (tests/oracle), and by
 * the function `hilbert` of PARI/GP.
 */
describe.each(places)('Hilbert symbols at %s', (_, p, field, pairs, size) => {
  it('agree with the formulas of Serre and with PARI/GP', () => {
    const cases = Array.from(
      { length: pairs },
      () => [entry(p === 0n ? 1n : p, size), entry(p === 0n ? 1n : p, size)] as const,
    );
    const lines = gpLines(
      `${gpVector(
        'A',
        cases.map(([a]) => a),
      )}\n${gpVector(
        'B',
        cases.map(([, b]) => b),
      )}\n` + `for(i=1,#A,print(hilbert(A[i],B[i],${p})))`,
    );
    const values = { plus: 0, minus: 0 };
    cases.forEach(([a, b], i) => {
      const symbol = hilbert(a, b, p);
      expect(`${symbol}`, `(${a}, ${b}) by the formulas`).toBe(lines[i]);
      expect(`${byForms(field, a, b)}`, `(${a}, ${b}) by forms`).toBe(lines[i]);
      values[symbol === 1 ? 'plus' : 'minus'] += 1;
    });
    expect(lines.length).toBe(pairs);
    expect(Math.min(values.plus, values.minus)).toBeGreaterThan(pairs / 8);
  });

  it('are bilinear and symmetric, and (a, −a) = (a, 1 − a) = 1 (Serre, III.1.1, Proposition 2)', () => {
    for (let i = 0; i < 40; i += 1) {
      const [a, b, c] = [entry(p === 0n ? 1n : p, 60n), entry(p === 0n ? 1n : p, 60n), entry(1n, 60n)];
      expect(byForms(field, a, b * c), `(${a}, ${b}·${c})`).toBe(byForms(field, a, b) * byForms(field, a, c));
      expect(byForms(field, a, b)).toBe(byForms(field, b, a));
      expect(byForms(field, a, -a)).toBe(1);
      if (a !== 1n) expect(byForms(field, a, 1n - a)).toBe(1);
    }
  });
});

describe('all places together', () => {
  it('the product of the symbols is 1 (Serre, III.2.1, Theorem 3), and over Q the form ⟪a, b⟫ is hyperbolic iff all are 1', () => {
    const verdicts = { equal: 0, different: 0, undecided: 0 };
    for (let i = 0; i < 250; i += 1) {
      const [a, b] = i % 3 === 0 ? normPair() : [entry(1n, 300n), entry(1n, 300n)];
      const primes = [...new Set([2n, ...primesOf(a), ...primesOf(b)])];
      const symbols = [byForms('R', a, b), ...primes.map((p) => byForms(`Q_${p}`, a, b))];
      expect(
        symbols.reduce<number>((x, y) => x * y, 1),
        `(${a}, ${b})`,
      ).toBe(1);
      const global = verdict('Q', `<<${entryText(a)}, ${entryText(b)}>>`, '0');
      expect(global, `⟪${a}, ${b}⟫`).toBe(symbols.every((s) => s === 1) ? 'equal' : 'different');
      verdicts[global] += 1;
    }
    expect(Math.min(verdicts.equal, verdicts.different)).toBeGreaterThan(40);
  });
});

/** A pair a, b with b = x² − ay² a norm from Q(√a), so that every symbol is 1. */
function normPair(): readonly [bigint, bigint] {
  for (;;) {
    const a = entry(1n, 50n);
    const [x, y] = [random(0n, 15n), random(1n, 15n)];
    const b = x * x - a * y * y;
    if (b !== 0n) return [a, b];
  }
}
