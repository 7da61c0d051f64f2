import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { Refusal } from '@/engine/expression/refusal';
import { elementText } from '@/engine/expression/to-text';
import type { ExtensionField } from '@/engine/field/extension-field';
import type { FiniteField } from '@/engine/field/field';
import { finiteField, primePower } from '@/engine/field/finite';
import { leastFactor } from '@/engine/field/irreducible';
import { leastIrreducible } from '@/engine/field/least-irreducible';
import { multiplyPolynomials, type Polynomial } from '@/engine/field/polynomial';
import { primeField } from '@/engine/field/prime-field';
import { readElement } from '@/engine/field/read-element';
import { resolveFiniteField } from '@/engine/field/resolve-finite';
import { writePolynomial } from '@/engine/field/write-polynomial';
import { readElement as readText, readFieldName } from '@/grammar/read';

const resolve = (name: string): FiniteField<unknown> => resolveFiniteField(readFieldName(name), unlimited);
const refusal = (name: string): { code: string; message: string; at: string | undefined } => {
  try {
    resolve(name);
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    return { code: error.code, message: error.message, at: error.at && name.slice(error.at.start, error.at.end) };
  }
  throw new Error(`${name} was accepted`);
};

describe('the least monic irreducible modulus', () => {
  const modulus = (q: bigint): string => {
    const field = finiteField(q) as ExtensionField<bigint>;
    return elementText(writePolynomial(field.base, field.modulus, 'z'));
  };

  it('is the one found by hand', () => {
    expect([4n, 8n, 9n, 16n, 25n, 27n, 32n, 49n].map(modulus)).toEqual(
      ['z^2+z+1', 'z^3+z+1', 'z^2+1', 'z^4+z+1', 'z^2+2', 'z^3+2z+1', 'z^5+z^2+1', 'z^2+1'].map((text) =>
        elementText(readText(text)),
      ),
    );
  });

  /** All monic polynomials of a degree, in order. */
  function* monics(p: bigint, d: number): Generator<Polynomial<bigint>> {
    for (let index = 0n; index < p ** BigInt(d); index++) {
      yield [...Array.from({ length: d }, (_, i) => (index / p ** BigInt(i)) % p), 1n];
    }
  }

  it('is the least that is no product', () => {
    for (const [p, d] of [
      [2n, 2],
      [2n, 3],
      [2n, 4],
      [2n, 5],
      [2n, 6],
      [3n, 2],
      [3n, 3],
      [3n, 4],
      [5n, 2],
      [5n, 3],
      [7n, 2],
      [13n, 2],
    ] as const) {
      const field = primeField(p);
      const products = new Set<string>();
      for (let i = 1; 2 * i <= d; i++) {
        for (const f of monics(p, i))
          for (const g of monics(p, d - i)) products.add(multiplyPolynomials(field, f, g).join());
      }
      const least = [...monics(p, d)].find((f) => !products.has(f.join()));
      expect(leastIrreducible(field, d, unlimited), `${p}^${d}`).toEqual(least);
    }
  });

  it('passes over the binomials of a large field at once when none is irreducible', () => {
    const p = (1n << 61n) - 1n; // p ≡ 3 mod 4, so that x^4 + c always splits
    expect(leastIrreducible(primeField(p), 4, unlimited)[1]).toBe(1n);
  });
});

describe('factors of reducible polynomials', () => {
  it('names the least root', () => {
    const field = primeField(1000003n);
    const f = [17n, 999n, 500000n].reduce<Polynomial<bigint>>(
      (g, root) => multiplyPolynomials(field, g, [field.negate(root), 1n]),
      [1n],
    );
    expect(leastFactor(field, f, unlimited, '')).toEqual([field.negate(17n), 1n]);
  });

  it('finds repeated factors and factors in characteristic 2', () => {
    const field = primeField(2n);
    const cubic: Polynomial<bigint> = [1n, 1n, 0n, 1n];
    const other: Polynomial<bigint> = [1n, 0n, 1n, 1n];
    expect(leastFactor(field, multiplyPolynomials(field, cubic, cubic), unlimited, '')).toEqual(cubic);
    expect(leastFactor(field, multiplyPolynomials(field, other, cubic), unlimited, '')).toEqual(cubic);
    expect(leastFactor(field, cubic, unlimited, '')).toBeUndefined();
  });
});

describe('prime powers', () => {
  it('are recognised', () => {
    expect(primePower(1n)).toBeUndefined();
    expect(primePower(36n)).toBeUndefined();
    expect(primePower(343n)).toEqual({ prime: 7n, degree: 3 });
    expect(() => finiteField(6n)).toThrow(RangeError);
  });
});

describe('names of finite fields', () => {
  it('are given back in one spelling', () => {
    const names = [
      ['F_7', 'F_7'],
      ['F_9', 'F_9'],
      ['F_3[z]/(z^2+1)', 'F_3[z]/(z^2+1)'],
      ['F_3[z]/(2z^2 - 1)', 'F_3[z]/(z^2+1)'],
      ['F_9[y]/(y^2+z+1)', 'F_9[y]/(y^2+z+1)'],
      ['F_7[y]/(y-3)', 'F_7[y]/(y+4)'],
      ['F_5[y]/((y^2+2)/3)', 'F_5[y]/(y^2+2)'],
      ['F_7[x1]/((x1+1)^2+1)', 'F_7[x1]/(x1^2+2x1+2)'],
      ['F_9[y]/(y^2+z+1)[x]/(x^2+y)', 'F_9[y]/(y^2+z+1)[x]/(x^2+y)'],
    ];
    for (const [typed, name] of names) {
      expect(resolve(typed!).name).toBe(name);
      expect(resolve(resolve(typed!).name).name).toBe(name);
    }
    expect(resolve('F_9[y]/(y^2+z+1)').order).toBe(81n);
    expect(resolve('F_9').tex).toBe('\\mathbb{F}_{9}');
  });

  it('know the letters of the tower', () => {
    const field = resolve('F_9[y]/(y^2+z+1)');
    const value = (text: string) => elementText(field.write(readElement(readText(text), field)));
    expect([value('y^2'), value('z^2'), value('(y+z)(y-z)'), value('1/z'), value('y^80'), value('7')]).toEqual(
      ['2z+2', '2', '2z', '2z', '1', '1'].map((text) => elementText(readText(text))),
    );
    expect(field.letter('t')).toBeUndefined();
  });

  it('are refused with the reason and what to type', () => {
    expect(refusal('F_6')).toEqual({
      code: 'field',
      message: '6 is not a power of a prime, so that there is no field with 6 elements. Type F_5 or F_7.',
      at: 'F_6',
    });
    expect(refusal('F_1').message).toBe(
      '1 is not a power of a prime, so that there is no field with 1 element. The least finite field is F_2.',
    );
    expect(refusal('F_11[x]/(x^2-5)')).toEqual({
      code: 'field',
      message: 'x^2-5 has the root 4 over F_11. Type an irreducible polynomial, or F_11 itself.',
      at: 'x^2-5',
    });
    expect(refusal('F_9[y]/(y^2-1)').message).toBe(
      'y^2-1 has the root 1 over F_9. Type an irreducible polynomial, or F_9 itself.',
    );
    expect(refusal('F_3[y]/(y^4+1)').message).toBe(
      'y^4+1 has the factor y^2+y+2 over F_3. Type an irreducible polynomial, or F_3 itself.',
    );
    expect(refusal('F_9[z]/(z^2+z+1)').message).toBe(
      'The letter z is used twice: F_9 has it already. Take another letter, such as y.',
    );
    expect(refusal('F_3[z]/(0)').message).toBe(
      'The modulus is 0 over F_3. Type an irreducible polynomial in z, such as z^2+1, or F_3 itself.',
    );
    expect(refusal('F_3[z]/(2)').message).toBe(
      'The modulus 2 is a constant. Type an irreducible polynomial in z, such as z^2+1, or F_3 itself.',
    );
    expect(refusal('F_3[z]/(z^2+t)')).toMatchObject({ code: 'unknown-letter', at: 't' });
    expect(refusal('F_3[z]/(1/z)').message).toBe(
      'The modulus must be a polynomial in z, and it is divided by an expression in z.',
    );
    expect(refusal('F_3[z]/(z^-1)').message).toBe(
      'The modulus must be a polynomial in z, and z has a negative exponent.',
    );
    expect(refusal('F_3[z]/(z^2/3)')).toMatchObject({ code: 'division-by-zero', at: '3' });
    expect(refusal('F_3[z]/(z^201+1)')).toMatchObject({ code: 'size' });
    expect(refusal(`F_${2n ** 201n}`)).toMatchObject({ code: 'size' });
    expect(refusal(`F_1${'0'.repeat(10001)}`)).toMatchObject({ code: 'size' });
    expect(refusal('Q[w]/(w^2-5)').message).toBe('Q is not a finite field. Type one such as F_7 or F_9.');
  });
});
