import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { factorOverRationals } from '@/engine/field/factor-rational';
import { numberField, type NumberField, type NumberFieldElement } from '@/engine/field/number-field';
import { isSquareInNumberField } from '@/engine/field/number-field-squares';
import type { Polynomial } from '@/engine/field/polynomial';
import { primesAbove } from '@/engine/field/primes-above';
import { rational, type Rational } from '@/engine/field/rational';
import { gpLines } from './arith-gp';

const stream = seeded(808);
const random = (low: bigint, high: bigint) => randomBetween(low, high, stream);
const pick = (n: number): number => Number(random(0n, BigInt(n - 1)));
const list = <T>(n: number, make: (i: number) => T): T[] => Array.from({ length: n }, (_, i) => make(i));
const small = (size: bigint): Rational => rational(random(-size, size), pick(3) === 0 ? random(1n, 6n) : 1n);

/** Number fields with a modulus drawn at random, of degree d. */
function drawField(d: number): NumberField {
  for (;;) {
    const f: Polynomial<Rational> = [...list(d, () => small(9n)), rational(1n)];
    const { factors } = factorOverRationals(f, unlimited);
    if (factors.length === 1 && factors[0]!.exponent === 1) return numberField('y', f);
  }
}

function drawElement(field: NumberField, size = 9n): NumberFieldElement {
  for (;;) {
    const a = list(field.modulus.length - 1, () => small(size));
    while (a.length > 0 && a[a.length - 1]!.num === 0n) a.pop();
    if (a.length > 0) return a;
  }
}

const spelled = (f: Polynomial<Rational>): string =>
  f.map(({ num, den }, i) => `(${num})/${den}*y^${i}`).join('+') || '0';
const integral = (f: readonly bigint[]): string => f.map((c, i) => `(${c})*y^${i}`).join('+');
const moduli: readonly bigint[][] = [
  [1n, 0n, 1n],
  [-5n, 0n, 1n],
  [-17n, 0n, 1n],
  [8n, -2n, 1n, 1n],
  [-2n, 0n, 0n, 1n],
  [1n, 0n, 0n, 0n, 1n],
  [1n, 1n, 1n, 1n, 1n],
  [-20n, 0n, 1n],
  [-44n, 0n, 1n],
  [-175n, 0n, 0n, 1n],
  [1n, 0n, -10n, 0n, 1n],
];
const fields = [
  ...moduli.map((f) =>
    numberField(
      'y',
      f.map((c) => rational(c)),
    ),
  ),
  ...list(24, (i) => drawField(1 + (i % 6))),
];

describe('against PARI/GP', () => {
  it('multiplies, inverts, takes norms and traces', () => {
    const cases = fields.flatMap((field) => list(8, () => ({ field, a: drawElement(field), b: drawElement(field) })));
    const lines = gpLines(
      cases
        .map(
          ({ field, a, b }) =>
            `P=${spelled(field.modulus)};a=Mod(${spelled(a)},P);b=Mod(${spelled(b)},P);n=poldegree(P);print([Vecrev(lift(a*b),n),Vecrev(lift(1/a),n),norm(a),trace(a)])`,
        )
        .join('\n'),
    );
    const text = ({ num, den }: Rational): string => (den === 1n ? `${num}` : `${num}/${den}`);
    cases.forEach(({ field, a, b }, i) => {
      const n = field.modulus.length - 1;
      const vector = (c: NumberFieldElement): string => `[${list(n, (k) => text(c[k] ?? rational(0n))).join(', ')}]`;
      const mine = [vector(field.multiply(a, b)), vector(field.inverse(a)), text(field.norm(a)), text(field.trace(a))];
      expect(`[${mine.join(', ')}]`, field.name).toBe(lines[i]);
    });
  });

  it('tells squares', () => {
    const cases = fields.flatMap((field) =>
      list(10, (i) => {
        const [a, b] = [drawElement(field), drawElement(field, 3n)];
        const square = field.multiply(a, a);
        // squares, squares times small numbers, and anything
        return {
          field,
          a: i < 3 ? square : i < 7 ? field.multiply(square, [rational(random(1n, 7n) * (pick(2) ? -1n : 1n))]) : b,
        };
      }),
    );
    const lines = gpLines(
      cases
        .map(({ field, a }) => {
          const { numerator, denominator } = field.model.integral(a);
          const modulus = integral(field.model.modulus);
          return `P=${modulus};print(#nfroots(P,'x^2-Mod((${integral(numerator)})/${denominator},P))>0)`;
        })
        .join('\n'),
    );
    cases.forEach(({ field, a }, i) =>
      expect(isSquareInNumberField(field, a, unlimited), `${spelled(a)} in ${field.name}`).toBe(lines[i] === '1'),
    );
    expect(lines.filter((line) => line === '1').length).toBeGreaterThan(100);
  });

  it('splits primes with the same ramification indices and residue degrees, those that divide the index among them', () => {
    const cases = fields.flatMap((field) => [2n, 3n, 5n, 7n, 11n, 13n, 101n].map((p) => ({ field, p })));
    const lines = gpLines(
      cases
        .map(
          ({ field, p }) =>
            `P=${integral(field.model.modulus)};nf=nfinit([P,[${p}]]);print(vecsort(apply(q->[q.e,q.f],idealprimedec(nf,${p}))))`,
        )
        .join('\n'),
    );
    let indexed = 0;
    cases.forEach(({ field, p }, i) => {
      const primes = primesAbove(field.model.modulus, p, unlimited);
      if (primes[0]!.generator === undefined) indexed++;
      const rows = primes.map((prime) => [prime.ramification, prime.residueDegree]);
      rows.sort((a, b) => a[0]! - b[0]! || a[1]! - b[1]!);
      expect(`[${rows.map((row) => `[${row.join(', ')}]`).join(', ')}]`, `${field.name} at ${p}`).toBe(lines[i]);
    });
    expect(indexed).toBeGreaterThan(10);
  });
});
