import { describe, expect, it } from 'vitest';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { fraction } from '../oracle/fraction';
import { hilbert, tame } from '../oracle/symbols';
import { canonicalText, verdict } from '../property/kmw-engine';

const stream = seeded(1966);
const random = (low: bigint, high: bigint): bigint => randomBetween(low, high, stream);

/** The least non-residue modulo an odd prime, by squaring. */
function nonResidue(p: number): number {
  const squares = new Set(Array.from({ length: p }, (_, x) => (x * x) % p));
  return Array.from({ length: p }, (_, x) => x).find((x) => !squares.has(x)) ?? 2;
}

/** Representatives of ℚ_p^×/²: 1, s, p, sp for odd p; ±1, ±5, ±2, ±10 for p = 2 (J.-P. Serre, A Course in Arithmetic, II.3.3). */
const classesOf = (p: number): readonly number[] =>
  p === 2 ? [1, -1, 5, -5, 2, -2, 10, -10] : [1, nonResidue(p), p, p * nonResidue(p)];

const rows = [2, 3, 5, 7, 11, 13, 101].map((p) => [p, `Q_${p}`, classesOf(p)] as const);

describe.each(rows)('p = %i', (p, name, classes) => {
  const prime = BigInt(p);
  const symbol = (a: number, b: number): 1 | -1 => hilbert(BigInt(a), BigInt(b), prime);
  const entry = (): bigint => {
    const n = random(-60n, 60n);
    return (n === 0n ? 1n : n) * prime ** random(0n, 2n);
  };

  it('the square classes are these, and no others', () => {
    expect(new Set(classes.map((c) => canonicalText(name, `<${c}>`))).size).toBe(p === 2 ? 8 : 4);
    for (let i = 0; i < 60; i += 1) {
      const a = entry();
      expect(classes.filter((c) => verdict(name, `<${a}>`, `<${c}>`) === 'equal')).toHaveLength(1);
    }
  });

  it('|W(ℚ_p)| is 16 for odd p and 32 for p = 2, by counting canonical forms (T. Y. Lam, Introduction to Quadratic Forms over Fields, VI.2)', () => {
    const found = new Map([['', '0']]);
    for (const word of found.values())
      for (const c of classes) {
        const next = `${word} + eta*<${c}>`;
        const text = canonicalText(name, next);
        if (!found.has(text)) found.set(text, next);
      }
    expect(found.size).toBe(p === 2 ? 32 : 16);
    // they are different classes, and a sum of two is one of them
    const words = [...found.values()];
    for (let i = 0; i < 60; i += 1) {
      const [x, y] = [words[Number(random(0n, 15n))] ?? '0', words[Number(random(0n, 15n))] ?? '0'];
      expect(verdict(name, x, y)).toBe(x === y ? 'equal' : 'different');
      expect(found.has(canonicalText(name, `${x} + ${y}`))).toBe(true);
    }
  });

  it('⟨1⟩ has order 2, 4 or 8 in W(ℚ_p) as p is 1 mod 4, 3 mod 4 or 2 (Lam, VI.2)', () => {
    let order = 1;
    while (verdict(name, `${order}eta`, '0') !== 'equal') order += 1;
    expect(order).toBe(p === 2 ? 8 : p % 4 === 3 ? 4 : 2);
  });

  it('⟨a, b⟩ represents c iff (c, −ab) = (a, b) (Serre, IV.2.2, Corollary to Theorem 6)', () => {
    for (const a of classes)
      for (const b of classes)
        for (const c of classes)
          expect(verdict(name, `<${a}, ${b}>`, `<${c}, ${a * b * c}>`), `<${a}, ${b}> and ${c}`).toBe(
            symbol(c, -a * b) === symbol(a, b) ? 'equal' : 'different',
          );
  });

  it('⟨a, b, c⟩ is isotropic iff (−1, −abc) is its Hasse invariant (Serre, IV.2.2, Theorem 6)', () => {
    for (const a of classes)
      for (const b of classes)
        for (const c of classes) {
          const hasse = symbol(a, b) * symbol(a, c) * symbol(b, c);
          const isotropic = symbol(-1, -a * b * c) === hasse;
          expect(verdict(name, `<${a}, ${b}, ${c}>`, `h + <${-a * b * c}>`)).toBe(isotropic ? 'equal' : 'different');
        }
  });

  it('there is one anisotropic form of rank 4, it is universal, and in degree 2 it is twice nothing (Lam, VI.2.2; Serre, IV.2.2)', () => {
    const [u, v] = p === 2 ? [-1, -1] : [nonResidue(p), p];
    expect(verdict(name, `<<${u}, ${v}>>`, '0')).toBe('different');
    expect(verdict(name, `2<<${u}, ${v}>>`, '0')).toBe('equal');
    for (const c of classes) expect(verdict(name, `<${c}><<${u}, ${v}>>`, `<<${u}, ${v}>>`)).toBe('equal');
    for (const a of classes)
      for (const b of classes)
        expect(verdict(name, `<<${a}, ${b}>>`, symbol(a, b) === 1 ? '0' : `<<${u}, ${v}>>`)).toBe('equal');
  });

  it('[a][b] = 0 iff the tame symbol is 1, for p = 2 iff the Hilbert symbol is (J. Milnor, Introduction to Algebraic K-Theory, Appendix)', () => {
    const verdicts = { equal: 0, different: 0, undecided: 0 };
    for (let i = 0; i < 150; i += 1) {
      const [a, b] = [entry(), entry()];
      const trivial = p === 2 ? hilbert(a, b, 2n) === 1 : tame(fraction(a), fraction(b), prime) === 1n;
      const judged = verdict(name, `[${a}][${b}]`, '0');
      expect(judged, `[${a}][${b}]`).toBe(trivial ? 'equal' : 'different');
      verdicts[judged] += 1;
    }
    expect(Math.min(verdicts.equal, verdicts.different)).toBeGreaterThan(15);
  });

  it('the cube of the fundamental ideal is 0, and so are products of three symbols (Lam, VI.2)', () => {
    for (let i = 0; i < 40; i += 1) {
      const [a, b, c] = [entry(), entry(), entry()];
      expect(verdict(name, `<<${a}, ${b}, ${c}>>`, '0')).toBe('equal');
      expect(verdict(name, `[${a}][${b}][${c}]`, '0')).toBe('equal');
    }
  });
});

describe('real and complex numbers', () => {
  it('over R forms are rank and signature, W = ℤ (Sylvester), and K_n is signs for n ≥ 2', () => {
    for (let i = 0; i < 60; i += 1) {
      const entries = Array.from(
        { length: Number(random(1n, 5n)) },
        () => random(0n, 1n) * 2n * random(1n, 9n) - random(1n, 9n) || 1n,
      );
      const minus = entries.filter((a) => a < 0n).length;
      const diagonal = `<${entries.join(', ')}>`;
      expect(verdict('R', diagonal, `${entries.length - minus}*1 + ${minus}<-1>`)).toBe('equal');
      expect(verdict('R', `eta*${diagonal}`, `${entries.length - 2 * minus}eta`.replace(/^-/, '-1*'))).toBe('equal');
      const [a, b] = [entries[0] ?? 1n, entries.at(-1) ?? 1n];
      expect(verdict('R', `[${a}][${b}]`, a < 0n && b < 0n ? '[-1][-1]' : '0')).toBe('equal');
    }
    for (let n = 1; n < 20; n += 1) expect(verdict('R', `${n}eta`, '0')).toBe('different');
    expect(verdict('R', '[-1]^5', '0')).toBe('different');
    expect(verdict('R', '[2]', '[3]')).toBe('different');
  });

  it('over C forms are their rank, W = ℤ/2, and K_n of rational numbers is 0 for n ≥ 2', () => {
    for (let i = 0; i < 40; i += 1) {
      const [a, b] = [random(1n, 99n), -random(1n, 99n)];
      expect(verdict('C', `<${a}, ${b}>`, '2')).toBe('equal');
      expect(verdict('C', `[${a}][${b}]`, '0')).toBe('equal');
      expect(verdict('C', `[${a}]`, `[${b}]`)).toBe('different');
    }
    expect([verdict('C', 'eta', '0'), verdict('C', '2eta', '0')]).toEqual(['different', 'equal']);
    expect(verdict('C', '[-1]', '0')).toBe('different');
  });
});
