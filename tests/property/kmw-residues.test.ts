import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { integerElement, negateElement, quotientElement, type Element } from '@/engine/expression/element';
import { angle, eta, negate, product, sum, symbol, type Expression } from '@/engine/expression/expression';
import { elementText, expressionText } from '@/engine/expression/to-text';
import { exponentIn, fraction, powerMod, raised, times, valueOf, type Fraction } from '../oracle/fraction';
import { tame } from '../oracle/symbols';
import { expectVerdict } from './kmw-engine';
import { rationalUnit } from './kmw-fields';
import { at, residuesOf, twisted } from './kmw-residue-calls';
import { homogeneous, word } from './kmw-words';

const number = (n: number): Element => (n < 0 ? negateElement(integerElement(BigInt(-n))) : integerElement(BigInt(n)));
const lowest = ({ num, den }: Fraction): Element => quotientElement(number(Number(num)), number(Number(den)));
const minusOne = symbol([number(-1)]);
const times_ = (...factors: Expression[]): Expression => product(factors);
const degrees = fc.integer({ min: -2, max: 3 });
const order = ({ num, den }: Fraction, p: bigint): number => exponentIn(num, p) - exponentIn(den, p);

/** Residues over ℚ: F. Morel, A¹-Algebraic Topology over a Field, LNM 2052, Theorem 3.15 to Remark 3.21, numbers from memory. */
describe.each([2, 3, 5, 7, 13, 101])('residues at %i', (p) => {
  const kappa = `F_${p}`;
  const any = rationalUnit([p, p, 2, 3, 5, 7]);
  const prime = BigInt(p);
  // in lowest terms, so that they are entries over the residue field too
  const unit = any
    .map(valueOf)
    .filter((a) => order(a, prime) === 0)
    .map(lowest);
  const pi = symbol([number(p)]);
  const equal = (left: Expression, right: Expression): void => expectVerdict('equal', kappa, left, right);
  const runs = { numRuns: 12 };
  const alpha = degrees.chain((n) => fc.tuple(fc.constant(n), homogeneous(any, n)));

  it('names the residue field, the uniformizer and the degree', () => {
    fc.assert(
      fc.property(alpha, ([n, a]) => {
        const { answer } = at(p, a);
        expect([answer.place, answer.residueField, elementText(answer.uniformizer)]).toEqual([`${p}`, kappa, `${p}`]);
        expect(answer.zero).toBe(expressionText(answer.value) === '0');
        if (!answer.zero) expect(answer.degree).toBe(n - 1);
      }),
      runs,
    );
  });

  it('a symbol with one entry π', () => {
    fc.assert(
      fc.property(fc.array(unit, { maxLength: 2 }), fc.integer({ min: 0, max: 2 }), (units, k) => {
        const etas = Array.from({ length: k }, () => eta());
        const tail = units.map((u) => symbol([u]));
        equal(at(p, product([...etas, pi, ...tail])).d, product([...etas, ...tail]));
        equal(at(p, product([...etas, ...tail])).d, sum([]));
        equal(at(p, product([...etas, ...tail])).s, product([...etas, ...tail]));
      }),
      runs,
    );
  });

  it('a power of π times a unit has residue n_ε⟨ū⟩, and its specialisation forgets π', () => {
    fc.assert(
      fc.property(fc.integer({ min: -7, max: 7 }), unit, (n, u) => {
        const found = at(p, `[(${p})^(${n})*(${elementText(u)})]`);
        equal(found.d, times_({ kind: 'epsilonInteger', count: BigInt(n) }, angle([u])));
        equal(found.s, symbol([u]));
      }),
      { numRuns: 25 },
    );
  });

  it('commutes with η, forms and symbols of units, on either side', () => {
    fc.assert(
      fc.property(alpha, unit, ([, a], u) => {
        const here = at(p, a);
        equal(at(p, times_(eta(), a)).d, times_(eta(), here.d));
        equal(at(p, times_(angle([u]), a)).d, times_(angle([u]), here.d));
        equal(at(p, times_(symbol([u]), a)).d, twisted(1, times_(symbol([u]), here.d)));
        equal(at(p, times_(a, symbol([u]))).d, times_(here.d, symbol([u])));
      }),
      runs,
    );
  });

  it('is a residue with π in front: ∂([π]α) = s(α) + [−1]∂(α), and s(α) = ⟨−1⟩∂([−π]α)', () => {
    fc.assert(
      fc.property(alpha, ([, a]) => {
        const here = at(p, a);
        equal(at(p, times_(pi, a)).d, sum([here.s, times_(minusOne, here.d)]));
        equal(here.s, times_(angle([number(-1)]), at(p, times_(symbol([number(-p)]), a)).d));
      }),
      runs,
    );
  });

  it('the product rule, and the specialisation is a ring map', () => {
    fc.assert(
      fc.property(alpha, alpha, ([n, a], [, b]) => {
        const [x, y, xy] = [at(p, a), at(p, b), at(p, times_(a, b))];
        const terms = [times_(x.d, y.s), twisted(n, times_(x.s, y.d)), times_(minusOne, x.d, y.d)];
        equal(xy.d, sum(terms));
        equal(xy.s, times_(x.s, y.s));
      }),
      { numRuns: 30 },
    );
    fc.assert(
      fc.property(word(any), word(any), (a, b) => {
        equal(at(p, sum([a, b])).s, sum([at(p, a).s, at(p, b).s]));
        equal(at(p, sum([a, b])).d, sum([at(p, a).d, at(p, b).d]));
        equal(at(p, times_(a, b)).s, times_(at(p, a).s, at(p, b).s));
      }),
      runs,
    );
  });

  it('change of uniformizer', () => {
    fc.assert(
      fc.property(alpha, unit, ([, a], u) => {
        const [x, y] = [at(p, a), at(p, a, `${p}*(${elementText(u)})`)];
        expect(valueOf(y.answer.uniformizer)).toEqual(times(fraction(prime), valueOf(u)));
        equal(y.d, times_(angle([u]), x.d));
        equal(y.s, sum([x.s, times_(negate(angle([u])), symbol([u]), x.d)])); // [ū⁻¹] = −⟨ū⟩[ū]
      }),
      { numRuns: 25 },
    );
  });

  it('modulo η in degree 2 it is the inverse of the tame symbol, in degree 1 the valuation (J. Milnor, Invent. Math. 9, 1970, §2)', () => {
    fc.assert(
      fc.property(any, any, (a, b) => {
        const [x, y] = [valueOf(a), valueOf(b)];
        const inverse = powerMod(tame(x, y, prime), prime - 2n, prime);
        // [a][b] is the only lift at hand, so compare modulo η: K^MW_1 = K^M_1 of a finite field
        equal(at(p, symbol([a, b])).d, symbol([integerElement(p === 2 ? 1n : inverse)]));
        const rank = at(p, symbol([a])).d;
        expectVerdict('equal', 'C', rank, { kind: 'epsilonInteger', count: BigInt(order(x, prime)) });
      }),
      { numRuns: 40 },
    );
  });

  it('on forms it is the second residue: ∂⟨πu⟩ = η⟨ū⟩, ∂⟨u⟩ = 0 (Milnor and Husemoller, Symmetric Bilinear Forms, IV.1)', () => {
    fc.assert(
      fc.property(any, (a) => {
        const x = valueOf(a);
        const n = order(x, prime);
        const { num, den } = times(x, raised(fraction(prime), BigInt(-n)));
        const u = product([
          angle([integerElement(num < 0n ? -num : num)]),
          angle([integerElement(den)]),
          angle([number(num < 0n ? -1 : 1)]),
        ]);
        equal(at(p, angle([a])).d, n % 2 === 0 ? sum([]) : times_(eta(), u));
        equal(at(p, angle([a])).s, u);
      }),
      { numRuns: 25 },
    );
  });

  it('a canonical form has the same residues', () => {
    fc.assert(
      fc.property(word(any, { terms: 2, factors: 2, nested: false }), (a) => {
        const all = residuesOf(a);
        expect(all.unramifiedElsewhere).toBe(true);
        const listed = all.residues.find(({ place }) => place === `${p}`);
        const here = at(p, a);
        if (here.answer.zero) expect(listed).toBeUndefined();
        else expect(expressionText(listed?.value ?? sum([]))).toBe(expressionText(here.answer.value));
      }),
      runs,
    );
  });
});
