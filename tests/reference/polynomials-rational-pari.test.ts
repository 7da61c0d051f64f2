import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { factorPrimitive } from '@/engine/field/factor-rational';
import { multiplyIntegers, primitivePart, type IntegerPolynomial } from '@/engine/field/integer-polynomial';
import { gpLines } from './arith-gp';

const stream = seeded(505);
const random = (low: bigint, high: bigint) => randomBetween(low, high, stream);
const pick = (n: number): number => Number(random(0n, BigInt(n - 1)));
const list = <T>(n: number, make: (i: number) => T): T[] => Array.from({ length: n }, (_, i) => make(i));
const draw = (size: bigint, d: number): IntegerPolynomial => [...list(d, () => random(-size, size)), random(1n, size)];
const spelled = (f: IntegerPolynomial): string => `Pol([${[...f].reverse().join(',')}])`;
const product = (factors: readonly IntegerPolynomial[]): IntegerPolynomial =>
  factors.reduce((f, g) => multiplyIntegers(f, g), [1n]);

/** Both lists as sorted lines. */
const mine = (f: IntegerPolynomial): string[] =>
  factorPrimitive(primitivePart(f), unlimited)
    .map(({ factor, exponent }) => `[${[...factor].reverse().join(', ')}] ${exponent}`)
    .sort();

function theirs(cases: readonly IntegerPolynomial[]): string[][] {
  const lines = gpLines(
    cases
      .map(
        (f) => `M=factor(${spelled(f)});for(i=1,#M~,print1(Vec(M[i,1]*sign(pollead(M[i,1])))," ",M[i,2],";"));print()`,
      )
      .join('\n'),
  );
  return lines.map((line) =>
    line
      .split(';')
      .filter((part) => part !== '')
      .sort(),
  );
}

function agree(cases: readonly IntegerPolynomial[]): void {
  const lines = theirs(cases);
  cases.forEach((f, i) => expect(mine(f), spelled(f)).toEqual(lines[i]));
}

describe('against PARI/GP', () => {
  it('factors random polynomials and products in the same way', () => {
    agree([
      ...list(200, (i) => draw(10n, 1 + (i % 14))),
      ...list(300, (i) => product(list(2 + (i % 4), () => draw(9n, 1 + pick(4))))),
      ...list(100, () => product(list(3, () => draw(1n << 40n, 1 + pick(6))))),
      ...list(100, () => {
        const f = draw(5n, 1 + pick(3));
        return product([f, f, draw(20n, 1 + pick(3)), ...list(pick(4), () => [0n, 1n])]);
      }),
      ...list(8, () => product([draw(10n ** 50n, 20), draw(10n ** 50n, 20)])),
      ...list(4, () => draw(10n ** 100n, 40)),
    ]);
  });

  it('factors x^n − 1 for every n up to 72, and x^n − a', () => {
    agree([
      ...list(72, (i) => [-1n, ...list(i, () => 0n), 1n]),
      ...[4n, -4n, 8n, 27n, 64n, -64n, 729n, 10n ** 30n].flatMap((a) =>
        [2, 3, 4, 6, 8, 12, 24].map((n) => [-a, ...list(n - 1, () => 0n), 1n]),
      ),
    ]);
  });
});
