import { describe, expect, it } from 'vitest';
import { Refusal } from '@/engine/expression/refusal';
import { elementText } from '@/engine/expression/to-text';
import type { Field } from '@/engine/field/field';
import { finiteField } from '@/engine/field/finite';
import { rationals } from '@/engine/field/rational';
import { readElement } from '@/engine/field/read-element';
import { readElement as readText } from '@/grammar/read';

const value = (text: string, field: Field<unknown>): string =>
  elementText(field.write(readElement(readText(text), field)));
const refusal = (
  text: string,
  field: Field<unknown>,
): readonly [code: string, message: string, at: string | undefined] => {
  try {
    readElement(readText(text), field);
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    return [error.code, error.message, error.at && text.slice(error.at.start, error.at.end)];
  }
  throw new Error(`${text} was accepted`);
};

describe('the value of a written element', () => {
  it('is a fraction in lowest terms over the rationals', () => {
    expect(value('(1/2+1/3)*6/10', rationals)).toBe('1/2');
    expect(value('-(2/4)', rationals)).toBe('-1/2');
    expect(value('(-2/3)^-3', rationals)).toBe('-27/8');
    expect(value('0^0', rationals)).toBe('1');
    expect(value('1-1', rationals)).toBe('0');
    expect(value(Array.from({ length: 60 }, (_, i) => `1/${i + 1}`).join('+'), rationals)).toBe(
      value(`${Array.from({ length: 60 }, (_, i) => `1/${60 - i}`).join('+')}`, rationals),
    );
  });

  it('is reduced over a finite field', () => {
    expect(value('10/3', finiteField(7n))).toBe('1');
    expect(value('-1', finiteField(7n))).toBe('6');
    expect(value('2^1000', finiteField(7n))).toBe('2');
    expect(value('z^3', finiteField(9n))).toBe(value('-z', finiteField(9n)));
  });

  it('has no letters that the field does not have', () => {
    expect(refusal('2+t', rationals)).toEqual([
      'unknown-letter',
      'Q has no letter t. Type a number, or choose a field with the letter t, such as Q(t).',
      't',
    ]);
    expect(refusal('x1', finiteField(7n))[1]).toBe(
      'F_7 has no letter x1. Type a number, or choose a field with the letter x1, such as F_7(x1).',
    );
    expect(refusal('z+w', finiteField(9n))).toEqual([
      'unknown-letter',
      'F_9 has no letter w. Its elements are written with z.',
      'w',
    ]);
  });

  it('is not a division by 0', () => {
    expect(refusal('1/7', finiteField(7n))).toEqual([
      'division-by-zero',
      'The denominator 7 is 0 in F_7. Change it to a unit.',
      '7',
    ]);
    expect(refusal('3/(z^2+1)', finiteField(9n))[1]).toBe('The denominator z^2+1 is 0 in F_9. Change it to a unit.');
    expect(refusal('2/(1-1)', rationals)[0]).toBe('division-by-zero');
    expect(refusal('0^-1', rationals)).toEqual([
      'division-by-zero',
      'The base of a negative power is 0 in Q. Change it to a unit.',
      '0',
    ]);
  });

  it('is refused past 100000 digits, a power before it is computed', () => {
    const long = '9'.repeat(5000);
    const message = 'This number has more than 100000 digits. Write it with smaller exponents.';
    expect(refusal(`2+(${long})^10000`, rationals)).toEqual(['size', message, `(${long})^10000`]);
    expect(refusal(`(1/${long})^-10000`, rationals)[0]).toBe('size');
    expect(refusal('(10^9999)^10*10^9999*(10^9999)', rationals)[0]).toBe('size');
    expect(value('(10^9999)^10/(10^9990)^10', rationals)).toBe(`1${'0'.repeat(90)}`);
    expect(value('(-1)^9999+1^10000', rationals)).toBe('0');
    expect(value(`(${long})^10000`, finiteField(7n))).toBe('1');
  });
});
