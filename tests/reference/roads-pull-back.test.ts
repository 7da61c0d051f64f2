import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Refusal } from '@/engine/expression/refusal';
import { expressionText } from '@/engine/expression/to-text';
import { readExpression } from '@/grammar/read';
import { decidePrimeField, decideRational, type Decided } from '../oracle/pull-back';
import { judge } from '../property/kmw-engine';
import { fieldRow, primeFieldUnit, rationalUnit, type FieldRow } from '../property/kmw-fields';
import { pair, type Pair } from '../property/kmw-statements';

interface Road {
  readonly row: FieldRow;
  readonly slow: (pair: Pair) => Decided;
  /** The maps the fast road may use. */
  readonly maps: readonly string[];
  readonly runs: number;
}

const small = { Q: rationalUnit([2, 3, 5, 7]), R: rationalUnit([2, 3]), C: rationalUnit([2, 3]) };

const roads: readonly Road[] = [
  {
    row: { ...fieldRow('Q'), unit: small.Q },
    slow: ({ left, right }) => decideRational('Q', left, right),
    maps: ['rank', 'signature', 'residue'],
    runs: 500,
  },
  {
    row: { ...fieldRow('R'), unit: small.R },
    slow: ({ left, right }) => decideRational('R', left, right),
    maps: ['rank', 'signature', 'product'],
    runs: 150,
  },
  {
    row: { ...fieldRow('C'), unit: small.C },
    slow: ({ left, right }) => decideRational('C', left, right),
    maps: ['rank', 'product'],
    runs: 150,
  },
  ...[2n, 3n, 5n, 7n].map((p): Road => ({
    row: fieldRow(`Q_${p}`),
    slow: ({ left, right }) => decideRational(p, left, right),
    maps: ['rank', 'discriminant', 'hasse', 'product', 'residue', 'class'],
    runs: 200,
  })),
  ...[2n, 3n, 5n, 7n, 11n, 101n].map((p): Road => ({
    row: { ...fieldRow(`F_${p}`), unit: primeFieldUnit(Number(p)) },
    slow: ({ left, right }) => decidePrimeField(p, left, right),
    maps: ['class'],
    runs: 120,
  })),
];

/**
 * Homomorphisms against a direct decision by the pull-back theorem (tests/oracle), which multiplies everything out: Milnor
 * K-theory by symbols, the Witt ring by diagonal forms.
 */
describe.each(roads.map((road) => [road.row.label, road] as const))('the fast road over %s', (_, road) => {
  const { row, slow, maps, runs } = road;

  it('agrees with the slow one, modulo η and modulo h too', () => {
    const counts = { equal: 0, different: 0, unusable: 0, fast: 0 };
    fc.assert(
      fc.property(pair(row), (statement) => {
        const { left, right } = statement;
        const written = `${expressionText(left)} = ${expressionText(right)}`;
        let slowly: Decided;
        try {
          slowly = slow(statement);
        } catch (error) {
          // an entry is zero, or too much to multiply out
          if (!(error instanceof RangeError)) throw error;
          counts.unusable += 1;
          if (!/slow road/.test(error.message)) expect(() => judge(row.name, left, right), written).toThrow(Refusal);
          return;
        }
        const fast = judge(row.name, left, right);
        expect(fast.verdict, written).toBe(slowly.equal ? 'equal' : 'different');
        expect(fast.evidence.modEta, `modulo η: ${written}`).toBe(slowly.modEta);
        expect(fast.evidence.modH, `modulo h: ${written}`).toBe(slowly.modH);
        counts[slowly.equal ? 'equal' : 'different'] += 1;
        // the fast road ran: by homomorphisms, these and no others, and a difference has its witness
        const used = fast.parts.flatMap(({ compared }) => compared);
        expect(fast.evidence.kind).toBe('invariants');
        expect(
          used.every(({ map }) => maps.includes(map)),
          used.map(({ map }) => map).join(),
        ).toBe(true);
        expect(fast.evidence.separating === undefined).toBe(slowly.equal);
        if (used.length > 0) counts.fast += 1;
      }),
      { numRuns: runs },
    );
    expect(counts.equal + counts.different + counts.unusable).toBeGreaterThanOrEqual(runs);
    expect(counts.fast).toBeGreaterThan(runs * 0.7);
    expect(counts.equal).toBeGreaterThan(runs * 0.2);
    expect(counts.different).toBeGreaterThan(runs * 0.02); // few over F_2, where 1 is the only unit
  });
});

describe('words no one can multiply out', () => {
  it.each([
    ['Q', '([2]+[3]+[30])^40', '([30]+[2]+[3])^40', 'equal'],
    ['Q', '([2]+[3]+[-30])^40', '([2]+[3]+[30])^40', 'different'],
    ['Q', '([6]+<10>)^30', '(<10>+[2]+<2>[3])^30', 'equal'],
    ['Q', '([6]+<10>)^31', '([6]+<-10>)^31', 'different'],
    ['Q_3', '(eta[2]+eta[3]+<30>)^64', '(<30>+<2>+<3>-2)^64', 'equal'],
    ['R', '([-2]+eta^2[-3]^2+<-5>)^40', '(<-1>-2eta[-1]+[-2])^40', 'equal'],
    ['F_7', '([3]+eta+<5>)^64', '(eta+[3]+<-1>)^64', 'equal'],
  ])('over %s: %s = %s', (name, left, right, expected) => {
    expect(judge(name, readExpression(left), readExpression(right)).verdict).toBe(expected);
  });
});
