import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { quotientElement, sumElement, type Element } from '@/engine/expression/element';
import { angle, eta, negate, product, sum, symbol, type Expression } from '@/engine/expression/expression';
import { elementText, expressionText } from '@/engine/expression/to-text';
import { readElement, readExpression } from '@/grammar/read';
import { expectVerdict, verdict, whereDefined } from './kmw-engine';
import { fieldRow } from './kmw-fields';
import { atPlace, functionRows, residuesOver, unitsOf, valueAt } from './kmw-function-fields';
import { twisted } from './kmw-residue-calls';
import { homogeneous } from './kmw-words';

const minusOne = readExpression('[-1]');
const rows = functionRows.flatMap((row) =>
  row.places.map((place) => [`${row.name} at ${place.place}`, row, place] as const),
);

/** Residues over k(t): F. Morel, A¹-Algebraic Topology over a Field, LNM 2052, Theorem 3.15 to Remark 3.21, numbers from memory. */
describe.each(rows)('residues over %s', (_, row, { place, residueField, uniformizer, t }) => {
  const { name, base } = row;
  const any = unitsOf(row);
  const pi = readExpression(`[${uniformizer}]`);
  const here = (e: Expression | string, parameter?: string) => atPlace(name, place, e, parameter);
  const equal = (left: Expression, right: Expression): void => expectVerdict('equal', residueField, left, right);
  const alpha = fc.integer({ min: -2, max: row.top }).chain((n) => fc.tuple(fc.constant(n), homogeneous(any, n)));

  /** Units at the place with their values there. */
  const unit: fc.Arbitrary<readonly [unit: Element, value: Element]> =
    t === undefined
      ? fc
          .tuple(fieldRow(base === 'Q' ? 'Q' : base).unit, fc.constantFrom('1', 't/(t+1)'))
          .map(([c, u]) => [{ kind: 'product', factors: [c, readElement(u)] } as Element, c])
      : any
          .map((u) => [u, valueAt(u, readElement(t))] as const)
          .filter(([, value]) => whereDefined(() => verdict(residueField, symbol([value]), '0')) !== undefined);
  const runs = { numRuns: 6 };

  it('names the residue field, the uniformizer and the degree', () => {
    fc.assert(
      fc.property(alpha, ([n, a]) => {
        const { answer } = here(a);
        expect(answer.place.replaceAll('*', '')).toBe(place);
        expect(answer.residueField).toBe(residueField);
        expect(elementText(answer.uniformizer)).toBe(uniformizer);
        expect(answer.zero).toBe(expressionText(answer.value) === '0');
        if (!answer.zero) expect(answer.degree).toBe(n - 1);
      }),
      runs,
    );
  });

  it('a power of π times a unit has residue n_ε⟨ū⟩, and its specialisation forgets π', () => {
    fc.assert(
      fc.property(fc.integer({ min: -7, max: 7 }), unit, (n, [u, value]) => {
        const found = here(`[(${uniformizer})^(${n})*(${elementText(u)})]`);
        equal(found.d, product([{ kind: 'epsilonInteger', count: BigInt(n) }, angle([value])]));
        equal(found.s, symbol([value]));
      }),
      { numRuns: 12 },
    );
  });

  it('commutes with η, forms and symbols of units, on either side', () => {
    fc.assert(
      fc.property(alpha, unit, ([n, a], [u, value]) => {
        const found = here(a);
        equal(here(product([eta(), a])).d, product([eta(), found.d]));
        equal(here(product([angle([u]), a])).d, product([angle([value]), found.d]));
        if (n >= row.top) return;
        equal(here(product([symbol([u]), a])).d, twisted(1, product([symbol([value]), found.d])));
        equal(here(product([a, symbol([u])])).d, product([found.d, symbol([value])]));
      }),
      runs,
    );
  });

  it('is a residue with π in front: ∂([π]α) = s(α) + [−1]∂(α), and s(α) = ⟨−1⟩∂([−π]α)', () => {
    fc.assert(
      fc.property(alpha, ([n, a]) => {
        if (n >= row.top) return;
        const found = here(a);
        equal(here(product([pi, a])).d, sum([found.s, product([minusOne, found.d])]));
        const other = here(product([readExpression(`[-(${uniformizer})]`), a]));
        equal(found.s, product([readExpression('<-1>'), other.d]));
      }),
      runs,
    );
  });

  it('the product rule, and the specialisation is a ring map', () => {
    fc.assert(
      fc.property(alpha, alpha, ([n, a], [m, b]) => {
        if (n + m > row.top) return;
        const [x, y, xy] = [here(a), here(b), here(product([a, b]))];
        const terms = [product([x.d, y.s]), twisted(n, product([x.s, y.d])), product([minusOne, x.d, y.d])];
        equal(xy.d, sum(terms));
        equal(xy.s, product([x.s, y.s]));
      }),
      { numRuns: 10 },
    );
  });

  it('change of uniformizer', () => {
    fc.assert(
      fc.property(alpha, unit, ([, a], [u, value]) => {
        const [x, y] = [here(a), here(a, `(${uniformizer})*(${elementText(u)})`)];
        equal(y.d, product([angle([value]), x.d]));
        equal(y.s, sum([x.s, product([negate(angle([value])), symbol([value]), x.d])])); // [ū⁻¹] = −⟨ū⟩[ū]
      }),
      { numRuns: 8 },
    );
  });

  it('is listed without being asked for exactly where it is not zero', () => {
    fc.assert(
      fc.property(alpha, ([, a]) => {
        const all = residuesOver(name, a);
        expect(all.unramifiedElsewhere).toBe(true);
        const listed = all.residues.find((residue) => residue.place === here(a).answer.place);
        expect(listed === undefined).toBe(here(a).answer.zero);
        if (listed !== undefined) equal(listed.value, here(a).d);
      }),
      runs,
    );
  });
});

describe('a uniformizer with another valuation is refused', () => {
  it.each([
    ['F_7(t)', 't', 't^2'],
    ['F_7(t)', 't^2+1', 't'],
    ['Q(t)', 't^2+1', '1/(t^2+1)'],
    ['Q(t)', 'infinity', 't'],
  ])('over %s at %s: %s', (name, place, uniformizer) => {
    expect(() => atPlace(name, place, '[t]', uniformizer)).toThrow(/valuation/);
  });

  it('and one beside several places, or a reducible place', () => {
    expect(() => residuesOver('F_7(t)', '[t]', ['t', 't+1'], 't')).toThrow(/exactly one place/);
    expect(() => residuesOver('F_7(t)', '[t]', ['t^2-1'])).toThrow(/reducible/);
    expect(() => residuesOver('Q(t)', '[t]', ['t^4-4'])).toThrow(/reducible/);
    expect(() => residuesOver('Q(t)', '[t]', ['3'])).toThrow(/constant/);
  });
});

/** A unit of a residue field of a quotient, to see that 1/(t−1) is no trouble where it is a unit. */
describe('entries with denominators', () => {
  it.each(functionRows.map(({ name }) => name))('over %s', (name) => {
    const u = quotientElement(readElement('t^2+t+1'), sumElement([readElement('t^3'), readElement('t')]));
    const alpha = symbol([u]);
    const twice = product([readExpression('h'), alpha]);
    expectVerdict('equal', name, symbol([{ kind: 'power', base: u, exponent: 2 }]), twice);
  });
});
