import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import type { Residue } from '@/engine/decide/outcome';
import { angle, eta, hyperbolic, integer, power, product, sum, type Expression } from '@/engine/expression/expression';
import { expressionText } from '@/engine/expression/to-text';
import type { Field, FiniteField } from '@/engine/field/field';
import { rationals } from '@/engine/field/rational';
import { readElement } from '@/engine/field/read-element';
import { resolveFiniteField } from '@/engine/field/resolve-finite';
import { resolveNumberField } from '@/engine/field/resolve-number';
import { resultant, type Polynomial } from '@/engine/field/polynomial';
import { readElement as parsed, readExpression, readFieldName } from '@/grammar/read';
import { diagonalised, formOf, transferOf, type Extension } from '../oracle/transfer';
import { expectVerdict } from './kmw-engine';
import { atPlace, functionRows, residuesOver, unitsOf } from './kmw-function-fields';
import { homogeneous } from './kmw-words';

const baseField = (name: string): Field<unknown> =>
  name === 'Q' ? (rationals as Field<unknown>) : (resolveFiniteField(readFieldName(name)) as FiniteField<unknown>);

/** The residue field of a residue as an extension of the constants; `undefined` at places of degree 1. */
function extensionOf(residueField: string, base: string): (Extension<unknown> & Field<readonly unknown[]>) | undefined {
  if (residueField === base) return undefined;
  const name = readFieldName(residueField);
  const found =
    base === 'Q' && name.kind === 'extension' ? resolveNumberField(name, unlimited) : resolveFiniteField(name);
  return found as unknown as Extension<unknown> & Field<readonly unknown[]>;
}

/** η^k times the transfer of a residue of degree −k ≤ 0. */
function transferred({ value, residueField }: Residue, base: string, etas: number): Expression {
  const tree = readExpression(expressionText(value));
  const k = baseField(base);
  const extension = extensionOf(residueField, base);
  if (extension === undefined) return tree;
  const form = formOf(tree, extension, (entry) => readElement(entry, extension));
  const terms = form.flatMap(([coefficient, unit]) => {
    const { entries, planes } = transferOf(extension, unit);
    return [
      ...entries.map((d) => product([integer(coefficient), angle([k.write(d)])])),
      product([integer(coefficient * BigInt(planes)), hyperbolic()]),
    ];
  });
  return product([power(eta(), etas), sum(terms)]);
}

/** The product of the entries of a class of degree 1, with coefficients as exponents, modulo η; then its norm to the constants. */
function norm({ value, residueField }: Residue, base: string): unknown {
  const k = baseField(base);
  const extension = extensionOf(residueField, base);
  const over: Field<unknown> = (extension as Field<unknown> | undefined) ?? k;
  const unit = milnor(readExpression(expressionText(value)), over);
  return extension === undefined
    ? unit
    : resultant(k, extension.modulus as Polynomial<unknown>, unit as Polynomial<unknown>);
}

function milnor(e: Expression, over: Field<unknown>): unknown {
  switch (e.kind) {
    case 'sum':
      return e.terms.map((term) => milnor(term, over)).reduce((a, b) => over.multiply(a, b), over.one);
    case 'negate':
      return over.inverse(milnor(e.of, over));
    case 'symbol':
      return readElement(e.entries[0]!, over);
    case 'integer':
      return over.one; // only 0 has degree 1
    case 'product': {
      const factors = e.factors.filter(({ kind }) => kind !== 'angle'); // forms are their ranks
      const isEta = ({ kind }: Expression): boolean => kind === 'eta';
      if (factors.some((factor) => isEta(factor) || (factor.kind === 'power' && isEta(factor.base)))) return over.one;
      const [first, last, more] = factors;
      if (first === undefined || more !== undefined)
        throw new RangeError(`not a class of degree 1: ${expressionText(e)}`);
      if (last === undefined) return milnor(first, over);
      if (first.kind !== 'integer') throw new RangeError(`not a class of degree 1: ${expressionText(e)}`);
      const unit = milnor(last, over);
      return Array.from({ length: Number(first.value) }, () => unit).reduce((a, b) => over.multiply(a, b), over.one);
    }
    default:
      throw new RangeError(`not a class of degree 1: ${expressionText(e)}`);
  }
}

/**
 * Reciprocity on the projective line: Σ_P τ_P(∂_P^P α) + ∂_∞^{−1/t}(α) = 0, τ_P the Scharlau transfer for s(t^(d−1)) = 1, s(tⁱ) = 0 for i < d − 1
 * (W. Scharlau, Quadratic and Hermitian Forms, 6.3; F. Morel, LNM 2052, section 4.2, numbers from memory).
 */
describe.each(functionRows.map((row) => [row.name, row] as const))('reciprocity over %s', (_, row) => {
  const { name, base } = row;
  const polynomials = row.places.filter(({ t }) => t !== undefined).map(({ place }) => parsed(place));
  const any = fc.oneof(
    { weight: 3, arbitrary: unitsOf(row) },
    { weight: 1, arbitrary: fc.constantFrom(...polynomials) },
  );
  const all = (a: Expression): readonly Residue[] => [
    ...residuesOver(name, a).residues.filter(({ place }) => place !== 'infinity'),
    atPlace(name, 'infinity', a, '-1/t').answer,
  ];

  it.each([1, 0, -1])('for classes of degree %i by transfers', (n) => {
    let higher = 0;
    fc.assert(
      fc.property(homogeneous(any, n), (a) => {
        const residues = all(a);
        if (residues.some(({ residueField }) => residueField !== base)) higher++;
        expectVerdict('equal', base, sum(residues.map((residue) => transferred(residue, base, 1 - n))), '0');
      }),
      { numRuns: 60 },
    );
    expect(higher).toBeGreaterThan(0);
  });

  it('for classes of degree 2 by norms, modulo η', () => {
    const k = baseField(base);
    fc.assert(
      fc.property(homogeneous(any, 2), (a) => {
        const product_ = all(a).reduce<unknown>((c, residue) => k.multiply(c, norm(residue, base)), k.one);
        expect(k.equal(product_, k.one), expressionText(a)).toBe(true);
      }),
      { numRuns: 25 },
    );
  });

  it('fails with 1/t for −1/t', () => {
    const alpha = readExpression('[t]'); // 1 at 0, and −⟨−1⟩ or −1 at infinity
    const finite = residuesOver(name, alpha).residues.filter(({ place }) => place !== 'infinity');
    const sums = ['-1/t', '1/t'].map((uniformizer) =>
      sum([...finite, atPlace(name, 'infinity', alpha, uniformizer).answer].map((r) => transferred(r, base, 0))),
    );
    expectVerdict('equal', base, sums[0]!, '0');
    const minusOneIsSquare = !['F_3', 'F_7', 'Q'].includes(base);
    expectVerdict(minusOneIsSquare ? 'equal' : 'different', base, sums[1]!, '0');
  });
});

describe('the oracle', () => {
  it('writes hyperbolic planes and metabolic ones as such', () => {
    const k = baseField('F_7');
    const [zero, one] = [k.zero, k.one];
    const { entries, planes } = diagonalised(k, [
      [zero, one],
      [one, zero],
    ]);
    expect(planes).toBe(0);
    expectVerdict('equal', 'F_7', sum(entries.map((d) => angle([k.write(d)]))), 'h');
    expect(
      diagonalised(baseField('F_2'), [
        [0n, 1n],
        [1n, 0n],
      ]).planes,
    ).toBe(1);
  });
});
