import { describe, expect, it } from 'vitest';
import type { Budget } from '@/engine/arith/budget';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { compare } from '@/engine/decide/compare';
import { normalize } from '@/engine/decide/normalize';
import { resolveField } from '@/engine/decide/registry';
import { residues } from '@/engine/decide/residues';
import { Refusal } from '@/engine/expression/refusal';
import { readElement, readExpression, readFieldName } from '@/grammar/read';

/** A budget that is over after so many steps. */
function steps(limit: number): Budget {
  let left = limit;
  return {
    spend(doing) {
      left -= 1;
      if (left < 0) throw new Refusal('budget', `Stopped while ${doing}.`);
    },
  };
}

const stream = seeded(1010);

/** A polynomial of degree d in t with coefficients of so many digits. */
function polynomial(d: number, digits: number): string {
  const coefficient = (): bigint => randomBetween(10n ** BigInt(digits - 1), 10n ** BigInt(digits) - 1n, stream);
  return Array.from({ length: d + 1 }, (_, i) => `${coefficient()}*t^${d - i}`).join(' + ');
}

/** The minimal polynomial of √p + √q + …: it splits into factors of degree ≤ 2 modulo every prime (H. P. F. Swinnerton-Dyer). */
function swinnertonDyer(primes: readonly bigint[]): string {
  let f: readonly bigint[] = [0n, 1n];
  for (const p of primes) {
    // f(t + √p) = a + b√p, and the next one is a² − pb²
    let [a, b]: [bigint[], bigint[]] = [[0n], [0n]];
    for (const c of [...f].reverse()) {
      const shift = (g: readonly bigint[], h: readonly bigint[], k: bigint): bigint[] =>
        Array.from({ length: Math.max(g.length + 1, h.length) }, (_, i) => (g[i - 1] ?? 0n) + k * (h[i] ?? 0n));
      [a, b] = [shift(a, b, p), shift(b, a, 1n)];
      a[0]! += c;
    }
    const square = (g: readonly bigint[], i: number): bigint => g.reduce((sum, c, j) => sum + c * (g[i - j] ?? 0n), 0n);
    f = Array.from({ length: 2 * f.length - 1 }, (_, i) => square(a, i) - p * square(b, i));
  }
  return f.map((c, i) => `(${c})*t^${i}`).join(' + ');
}

const judged = (field: string, left: string, limit: number): string => {
  const budget = steps(limit);
  try {
    return compare(resolveField(readFieldName(field), budget), readExpression(left), readExpression('0'), [], budget)
      .verdict;
  } catch (error) {
    if (error instanceof Refusal) return error.code;
    throw error;
  }
};

describe('polynomials made to be hard', () => {
  it.each([
    ['F_7(t)', '[t^10000+t+1][t+2]', 40],
    ['F_2(t)', '[t^9999+t+1][t+1]', 200],
    ['F_4(t)', '[t^5000+z*t+1][t+z]', 40],
    ['Q(t)', '[t^10000+t+1][t+2]', 200],
    ['Q(t)', '[t^10000-1][t^9999-1]', 200],
  ])('of a large degree end within the budget: %s, %s', (field, left, limit) => {
    expect(judged(field, left, limit)).toBe('budget');
  });

  it('powers are not multiplied out', () => {
    expect(judged('Q(t)', '[(t+3)^10000][t^2+2]', 20_000)).toBe('different');
    expect(judged('F_7(t)', '[(t^3+2)^10000][(t+1)^9999]', 20_000)).toBe('different');
    expect(judged('Q(t)', '[(t+1)^10000*(t+2)^(-10000)][t^2+1]', 20_000)).toBe('different');
    expect(judged('Q(t)', '[((t+1)^10000+1)^10000]', 20_000)).toBe('size');
  });

  it('Swinnerton-Dyer polynomials are recognised up to degree 32, and end within the budget past it', () => {
    expect(judged('Q(t)', `[${swinnertonDyer([2n, 3n, 5n])}]`, 20_000)).toBe('different');
    expect(judged('Q(t)', `[${swinnertonDyer([2n, 3n, 5n, 7n, 11n])}]`, 20_000)).toBe('different');
    expect(judged('Q(t)', `[${swinnertonDyer([2n, 3n, 5n, 7n, 11n, 13n])}]`, 20_000)).toBe('budget');
    expect(judged('F_1000003(t)', `[${swinnertonDyer([2n, 3n, 5n, 7n, 11n, 13n])}]`, 20_000)).toBe('different');
  });

  it('coefficients of 100 digits in degree 40', () => {
    const [f, g, h] = [polynomial(40, 100), polynomial(20, 100), polynomial(20, 50)];
    expect(judged('Q(t)', `[(${g})*(${h})] - [${g}] - [${h}] - eta*[${g}][${h}]`, 200_000)).toBe('equal');
    expect(judged('Q(t)', `[${f}] - [t]`, 200_000)).toBe('different');
    expect(['different', 'budget']).toContain(judged('Q(t)', `[${f}][${g}]`, 2_000));
  });

  it('number fields of a large degree end within the budget', () => {
    const field = `Q[w]/(w^40-2)`;
    expect(['different', 'budget']).toContain(judged(field, '<w+1> + <w-3> - <w> - <5>', 2_000));
    expect(['different', 'budget']).toContain(judged(field, '[w+1][w-3]', 2_000));
  });

  it('canonical forms and residues, too', () => {
    const within = (work: (budget: Budget) => unknown): string => {
      try {
        work(steps(20_000));
        return 'done';
      } catch (error) {
        if (error instanceof Refusal) return error.code;
        throw error;
      }
    };
    const form = (field: string, text: string): string =>
      within((budget) => normalize(resolveField(readFieldName(field), budget), readExpression(text), {}, budget));
    expect(form('F_1000003(t)', '[t^60+t+1][t^59+3]')).toBe('done');
    expect(['done', 'budget']).toContain(form('Q(t)', 'eta[t^40-2][t+2][t-3]'));
    const asked = [{ text: 't^40-2', element: () => readElement('t^40-2') }];
    expect(
      within((budget) =>
        residues(
          resolveField(readFieldName('Q(t)'), budget),
          readExpression('[t^40-2]<t+5>'),
          { places: asked },
          budget,
        ),
      ),
    ).toMatch(/done|budget/);
  });
});
