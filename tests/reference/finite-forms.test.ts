import { describe, expect, it } from 'vitest';
import { canonicalText, verdict } from '../property/kmw-engine';

/** All polynomials in a letter below a degree with coefficients from a list, as they are typed. */
const polynomials = (coefficients: readonly string[], letter: string, degree: number): readonly string[] =>
  Array.from({ length: degree }, (_, e) => e).reduce<readonly string[]>(
    (sums, e) => sums.flatMap((sum) => coefficients.map((c) => (e === 0 ? c : `${sum}+(${c})*${letter}^${e}`))),
    [''],
  );

const digits = (p: number): readonly string[] => Array.from({ length: p }, (_, i) => `${i}`);

interface Row {
  readonly name: string;
  readonly q: number;
  readonly elements: readonly string[];
}

const prime = (p: number): Row => ({ name: `F_${p}`, q: p, elements: digits(p) });
const extension = (p: number, d: number): Row => ({
  name: `F_${p ** d}`,
  q: p ** d,
  elements: polynomials(digits(p), 'z', d),
});

const rows: readonly Row[] = [
  ...[2, 3, 5, 7, 11, 13].map(prime),
  ...(
    [
      [2, 2],
      [2, 3],
      [3, 2],
      [5, 2],
      [3, 3],
    ] as const
  ).map(([p, d]) => extension(p, d)),
  { name: 'F_9[y]/(y^2+z+1)', q: 81, elements: polynomials(polynomials(digits(3), 'z', 2), 'y', 2) },
];

/** Milnor–Witt K-theory of finite fields, exhaustively: sources beside each statement. */
describe.each(rows.map((row) => [row.name, row] as const))('over %s', (name, { q, elements }) => {
  const units = elements.slice(1);
  // a few units are enough where all pairs or triples would be many
  const some = units.filter((_, i) => units.length < 13 || i % Math.ceil(units.length / 7) === 1);
  const text = (word: string): string => canonicalText(name, word);
  const squares = new Set(units.map((u) => text(`[(${u})^2]`)));
  const isSquare = (u: string): boolean => squares.has(text(`[${u}]`));
  const nonSquare = units.find((u) => !isSquare(u));

  it('degree 1 is the group of units, cyclic of order q − 1', () => {
    expect(new Set(units.map((u) => text(`[${u}]`))).size).toBe(q - 1);
    expect(units.every((u) => text(`${q - 1}[${u}]`) === '')).toBe(true);
    const orderOf = (u: string): number => {
      let n = 1;
      while (text(`${n}[${u}]`) !== '') n += 1;
      return n;
    };
    if (q <= 27) expect(Math.max(...units.map(orderOf))).toBe(q - 1);
    for (const a of some) for (const b of some) expect(text(`[(${a})*(${b})]`)).toBe(text(`[${a}] + [${b}]`));
  });

  it('half of the units are squares, all of them in characteristic 2', () => {
    expect(squares.size).toBe(q % 2 === 0 ? q - 1 : (q - 1) / 2);
  });

  it('K_2 = 0, and so K^MW_n = 0 for n ≥ 2 (J. Milnor, Introduction to Algebraic K-Theory, Corollary 9.9, number from memory)', () => {
    for (const a of some)
      for (const b of some) expect(verdict(name, `[${a}][${b}]`, '0'), `[${a}][${b}]`).toBe('equal');
    for (const a of some) expect(text(`[${a}][${a}][${a}] - 5[-1][${a}] + [${a}]^4`)).toBe('');
  });

  it('GW is rank and discriminant, characteristic 2: rank alone (T. Y. Lam, Introduction to Quadratic Forms, II.3; Milnor and Husemoller)', () => {
    for (const a of some) {
      expect(verdict(name, `<${a}>`, '1')).toBe(isSquare(a) ? 'equal' : 'different');
      for (const b of some) {
        expect(verdict(name, `<${a}, ${b}>`, `<1, (${a})*(${b})>`)).toBe('equal');
        expect(verdict(name, `<${a}>`, `<${b}>`)).toBe(isSquare(`(${a})*(${b})`) ? 'equal' : 'different');
      }
    }
    const forms = ['1', ...(nonSquare === undefined ? [] : [nonSquare])];
    const rankTwo = new Set(forms.flatMap((a) => forms.map((b) => text(`<${a}, ${b}>`))));
    expect(rankTwo.size).toBe(forms.length);
    expect(verdict(name, '3<1>', '2<1>')).toBe('different');
  });

  it('every form of rank 2 is universal, and of rank 3 isotropic (Lam, II.3.4, number from memory)', () => {
    for (const a of some)
      for (const b of some) {
        for (const c of some.slice(0, 4))
          expect(verdict(name, `<${a}, ${b}>`, `<${c}, (${a})*(${b})*(${c})>`)).toBe('equal');
        expect(verdict(name, `<${a}, ${b}, 1>`, `h + <-(${a})*(${b})>`)).toBe('equal');
      }
  });

  it('the Witt ring is ℤ/4 for q ≡ 3 mod 4, ℤ/2[F^×/F^×²] for q ≡ 1 mod 4, ℤ/2 for even q (Lam, II.3.6, number from memory)', () => {
    const classes = new Set<string>();
    const forms = ['1', nonSquare ?? '1'];
    for (let i = 0; i < 4; i += 1)
      for (let j = 0; j < 4; j += 1) classes.add(text(`eta*(${i}<1> + ${j}<${forms[1] ?? '1'}>)`));
    expect(classes.size).toBe(q % 2 === 0 ? 2 : 4);
    let order = 1;
    while (text(`${order}eta`) !== '') order += 1;
    expect(order).toBe(q % 4 === 3 ? 4 : 2);
    const s = nonSquare ?? '1';
    // the product in ℤ/2[σ], σ = ⟨s⟩: (1 + σ)² = 0; in ℤ/4, ⟨s⟩ = −1
    if (q % 4 === 1) expect(verdict(name, `eta*<1, ${s}>^2`, '0')).toBe('equal');
    if (q % 4 === 1) expect(verdict(name, `eta*<1, ${s}>`, '0')).toBe('different');
    if (q % 4 === 3) expect(verdict(name, `eta*<${s}>`, '-eta')).toBe('equal');
  });

  it('the square of the fundamental ideal is 0 (Lam, II.3)', () => {
    for (const a of some)
      for (const b of some) {
        expect(verdict(name, `<<${a}, ${b}>>`, '0')).toBe('equal');
        expect(verdict(name, `eta^3[${a}][${b}]`, '0')).toBe('equal');
      }
  });

  it('−1 is a square iff q is not 3 modulo 4', () => {
    expect(verdict(name, '<-1>', '1')).toBe(q % 4 === 3 ? 'different' : 'equal');
    expect(verdict(name, 'h', '2')).toBe(q % 4 === 3 ? 'different' : 'equal');
    expect(verdict(name, '[-1]', '0')).toBe(q % 2 === 0 ? 'equal' : 'different');
  });
});
