import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { integerElement, negateElement, quotientElement, type Element } from '@/engine/expression/element';
import { expressionText } from '@/engine/expression/to-text';
import { declarePrimes } from '../oracle/fraction';
import { decideRational } from '../oracle/pull-back';
import { canonicalText, judge } from '../property/kmw-engine';
import { fieldRow } from '../property/kmw-fields';
import { editedPair, equalPair } from '../property/kmw-statements';

/** Primes whose products are too large to be taken apart by trial division. */
const large = [
  1_000_000_007n,
  1_000_000_009n,
  2n ** 31n - 1n,
  2_418_525_407n,
  2_724_573_737n,
  2n ** 32n - 5n,
  2n ** 32n - 17n,
  10n ** 12n + 39n,
  10n ** 12n + 61n,
  2n ** 61n - 1n,
];
const small = [2n, 3n, 5n, 7n, 11n, 13n, 181n];
/** 2·3·…·137: more primes in sight than an integer of 32 bits has room for. */
const primorial = [...Array(138).keys()]
  .filter((n) => n > 1 && [...Array(n).keys()].every((d) => d < 2 || n % d !== 0))
  .reduce((product, n) => product * BigInt(n), 1n);

declarePrimes(large);

const number = fc
  .tuple(
    fc.array(fc.constantFrom(...large), { minLength: 0, maxLength: 3 }),
    fc.array(fc.constantFrom(...small), { minLength: 0, maxLength: 2 }),
  )
  .map(([big, factors]) => [...big, ...factors].reduce((product, p) => product * p, 1n));

const unit: fc.Arbitrary<Element> = fc
  .tuple(
    fc.oneof({ weight: 12, arbitrary: number }, { weight: 1, arbitrary: fc.constant(primorial) }),
    number,
    fc.nat(9),
  )
  .map(([top, bottom, kind]) => {
    const size = kind < 2 ? quotientElement(integerElement(top), integerElement(bottom)) : integerElement(top);
    return kind % 2 === 0 ? size : negateElement(size);
  });

/** Composites are compared without being split where that can be done; the slow road knows their primes. */
describe('entries with large primes, over Q', () => {
  const row = { ...fieldRow('Q'), unit, sums: false };

  it('are judged as by the slow road, which was told their primes', () => {
    const counts = { equal: 0, different: 0 };
    fc.assert(
      fc.property(fc.oneof(equalPair(row), editedPair(row)), ({ left, right }) => {
        const slow = decideRational('Q', left, right);
        const { verdict, evidence } = judge('Q', left, right);
        const written = `${expressionText(left)} = ${expressionText(right)}`;
        expect(verdict, written).toBe(slow.equal ? 'equal' : 'different');
        expect([evidence.modEta, evidence.modH], written).toEqual([slow.modEta, slow.modH]);
        counts[slow.equal ? 'equal' : 'different'] += 1;
      }),
      { numRuns: 150 },
    );
    expect(Math.min(counts.equal, counts.different)).toBeGreaterThan(15);
  });

  it('a common summand with many primes does not hide a difference', () => {
    const form = (n: bigint): string => `<${n}>`;
    const [p, q, s] = [2_724_573_737n, 2_418_525_407n, 181n]; // s is no square modulo p
    for (const a of [p * q, -p * q, p * p * q])
      for (const rest of ['0', `<${primorial}>`, `[${primorial}]`]) {
        const [left, right] = [`${form(a)} + ${form(s)} + ${rest}`, `${form(a * s)} + 1 + ${rest}`];
        expect(judge('Q', left, right).verdict).toBe('different');
      }
  });

  it('canonical forms agree with the verdict', () => {
    const plain = fc.tuple(fc.constantFrom(...large), fc.constantFrom(...small)).map(([p, s]) => integerElement(p * s));
    fc.assert(
      fc.property(
        fc.oneof(equalPair({ ...row, unit: plain }), editedPair({ ...row, unit: plain })),
        ({ left, right }) => {
          const { verdict } = judge('Q', left, right);
          expect(canonicalText('Q', left) === canonicalText('Q', right)).toBe(verdict === 'equal');
        },
      ),
      { numRuns: 12 },
    );
  });
});
