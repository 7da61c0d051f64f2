import { describe, expect, test } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { compare } from '@/engine/decide/compare';
import { normalize } from '@/engine/decide/normalize';
import { resolveField } from '@/engine/decide/registry';
import { expressionText } from '@/engine/expression/to-text';
import { readExpression, readFieldName, readStatement } from '@/grammar/read';

const decide = (name: string, left: string, right: string) =>
  compare(resolveField(readFieldName(name), unlimited), readExpression(left), readExpression(right), [], unlimited);

const form = (statement: string): string => {
  const { sides, conditions } = readStatement(statement);
  const [side] = sides;
  if (side === undefined) throw new Error('no side');
  const { parts } = normalize(resolveField(readFieldName('any'), unlimited), side, { conditions }, unlimited);
  return parts.map(({ normalForm }) => expressionText(normalForm)).join(' + ') || '0';
};

// N is a product of two primes that both leave the remainder 3 modulo 4, so −1 is a non-square at both: [N][−1] ≠ 0.
const N = '8800171073639374381';

describe('entries that are not split into primes', () => {
  test('a difference in one degree settles no other degree', () => {
    const { verdict, parts } = decide('Q', '1', `[${N},-1]`);
    expect(verdict).toBe('different');
    expect(parts.map((part) => [part.degree, part.verdict])).toEqual([
      [2, 'different'],
      [0, 'different'],
    ]);
  });

  test('what is not known modulo h is found out before it is said', () => {
    expect(decide('Q', 'h', '[-1, 1/2320901811932877458780642376140321563]').evidence.modH).toBe(false);
  });

  test('the values shown where the sides differ are different', () => {
    const { parts } = decide('Q', '<-6589450806179435959> + 1', '<6589450806179435959> + <-1>');
    for (const { compared } of parts)
      for (const { same, left, right } of compared) expect(expressionText(left) === expressionText(right)).toBe(same);
  });

  test('the Witt relation holds for numbers nobody factors', () => {
    const a = `${10n ** 120n + 7n}`;
    const b = `${10n ** 97n + 33n}`;
    expect(decide('Q', `<${a}> + <${b}>`, `<${a}+${b}> + <${a}*${b}*(${a}+${b})>`).verdict).toBe('equal');
  });
});

describe('characteristic p among letters', () => {
  test.each(['3', '5', '7', '13'])(
    'a class of −1 and η has one form, and it reads back beside letters (p = %s)',
    (p) => {
      for (const word of ['[-1]', '<-1>', '2 - <-1>', 'eta[-1]', 'eta^2', '3eta<-1>', 'eps', '5_eps']) {
        const alone = form(`${word} ; char = ${p}`);
        expect(form(`${word} + [a] - [a] ; char = ${p}`)).toBe(alone);
        expect(form(`${alone} + [a] ; char = ${p}`)).toBe(form(`${word} + [a] ; char = ${p}`));
      }
    },
  );
});
