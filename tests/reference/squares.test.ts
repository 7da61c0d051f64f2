import { describe, expect, it } from 'vitest';
import { primesOf, exponentIn } from '../oracle/fraction';
import { canonicalText, verdict } from '../property/kmw-engine';

const upTo = (n: number): readonly number[] => Array.from({ length: n }, (_, i) => i + 1);
const root = (n: number): number | undefined => {
  const r = Math.round(Math.sqrt(n));
  return r * r === n ? r : undefined;
};

/** n = x² + y² + z², by search. */
function threeSquares(n: number): readonly [number, number, number] | undefined {
  for (let x = 0; x * x <= n; x += 1)
    for (let y = 0; x * x + y * y <= n; y += 1) {
      const z = root(n - x * x - y * y);
      if (z !== undefined) return [x, y, z];
    }
  return undefined;
}

/** Sums of squares as equalities of forms (J.-P. Serre, A Course in Arithmetic, IV.3 and Appendix to chapter IV). */
describe('sums of squares over the rational numbers', () => {
  it('n is a sum of two iff ⟨1, 1⟩ = ⟨n, n⟩, iff every prime 3 mod 4 divides it to an even power', () => {
    for (const n of upTo(200)) {
      const primes = primesOf(BigInt(n));
      const sum = primes.every((p) => p % 4n !== 3n || exponentIn(BigInt(n), p) % 2 === 0);
      expect(verdict('Q', '<1, 1>', `<${n}, ${n}>`), `${n}`).toBe(sum ? 'equal' : 'different');
    }
  });

  it('n is a sum of three iff it is not 4^a(8b + 7): then ⟨1, 1, 1⟩ splits off ⟨n⟩, else it does so with no complement over Q_2', () => {
    let excluded = 0;
    for (const n of upTo(150)) {
      let core = n;
      while (core % 4 === 0) core /= 4;
      const found = threeSquares(n);
      expect(found === undefined, `${n}`).toBe(core % 8 === 7);
      const complement = (c: number): string => `<${n}, ${c}, ${n * c}>`; // the discriminant is 1
      const overTwo = [1, -1, 5, -5, 2, -2, 10, -10].filter(
        (c) => verdict('Q_2', '<1, 1, 1>', complement(c)) === 'equal',
      );
      if (found === undefined) {
        excluded += 1;
        expect(overTwo).toEqual([]);
        for (const c of [1, 2, 3, 5, n, n + 1]) expect(verdict('Q', '<1, 1, 1>', complement(c))).toBe('different');
        continue;
      }
      expect(overTwo.length).toBeGreaterThan(0);
      // (−y, x, 0) is orthogonal to (x, y, z)
      const [x, y, z] = found;
      const c = x * x + y * y === 0 ? z * z : x * x + y * y;
      expect(verdict('Q', '<1, 1, 1>', complement(c)), `${n}`).toBe('equal');
    }
    expect(excluded).toBe(23); // 18 + 4 + 1 with a = 0, 1, 2
  });

  it('every n > 0 is a sum of four (Lagrange): ⟨n⟩ is a similarity factor of ⟨1, 1, 1, 1⟩, for n > 0 only', () => {
    for (const n of upTo(120)) {
      expect(verdict('Q', `<${n}>*4`, '4')).toBe('equal');
      expect(verdict('Q', `<-${n}>*4`, '4')).toBe('different');
    }
  });

  it('x² + y² + z² − nt² = 0 has a solution over Q iff it has one over Q_2, for n > 0 (Hasse–Minkowski)', () => {
    for (const n of upTo(40)) {
      // the discriminant is −n, so an isotropic form is h + ⟨c, cn⟩
      const isotropic = [1, -1, 5, -5, 2, -2, 10, -10].some(
        (c) => verdict('Q_2', `<1, 1, 1, -${n}>`, `h + <${c}, ${c * n}>`) === 'equal',
      );
      expect(isotropic, `${n}`).toBe(threeSquares(n) !== undefined);
    }
  });

  it('the level: −1 is no sum of squares in R, one in Q_5, two in Q_3, four in Q_2', () => {
    const level = (name: string): number | undefined =>
      [1, 2, 4].find((s) => verdict(name, `${2 * s}eta`, '0') === 'equal');
    expect(['R', 'Q_5', 'Q_3', 'Q_2'].map(level)).toEqual([undefined, 1, 2, 4]);
    expect(['F_2', 'F_5', 'F_7', 'F_9', 'F_27'].map(level)).toEqual([1, 1, 2, 1, 2]);
    expect(canonicalText('C', '2eta')).toBe('');
  });

  it('a binary form is determined by its discriminant and one value: ⟨a, b⟩ = ⟨c, abc⟩ for every value c', () => {
    for (const a of [1, 2, -3, 5])
      for (const b of [1, -2, 3, 7])
        for (const [x, y] of [
          [1, 1],
          [2, 1],
          [1, 3],
          [3, 2],
        ] as const) {
          const c = a * x * x + b * y * y;
          if (c !== 0) expect(verdict('Q', `<${a}, ${b}>`, `<${c}, ${a * b * c}>`)).toBe('equal');
        }
  });
});
