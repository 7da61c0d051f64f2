import fc from 'fast-check';
import {
  integerElement,
  letterElement,
  negateElement,
  powerElement,
  productElement,
  quotientElement,
  sumElement,
  type Element,
} from '@/engine/expression/element';
import type { Condition } from '@/engine/expression/statement';

/** A field the engine decides over: its name and random units. A new field is one row. */
export interface FieldRow {
  readonly name: string;
  readonly unit: fc.Arbitrary<Element>;
  readonly conditions: readonly Condition[];
  /** Sums of entries are entries again: not so for products of letters. */
  readonly sums: boolean;
  /** More than one unit, so that a and 1 − a can both be units. */
  readonly steinberg: boolean;
  /** Normal forms are canonical. */
  readonly canonical: boolean;
  /** The degree in which a verdict may stay open. */
  readonly open?: number;
  readonly label: string;
}

const integer = (n: number | bigint): Element =>
  n < 0 ? negateElement(integerElement(BigInt(n) * -1n)) : integerElement(BigInt(n));

/** Rational units: products of small primes, with p more often than others, and any numbers. */
export function rationalUnit(primes: readonly number[] = [2, 3, 5, 7, 11, 13]): fc.Arbitrary<Element> {
  const power_ = fc
    .tuple(fc.constantFrom(...primes), fc.integer({ min: -3, max: 3 }))
    .map(([p, e]) => (e === 1 ? integer(p) : powerElement(integer(p), e)));
  const smooth = fc.tuple(fc.boolean(), fc.array(power_, { minLength: 1, maxLength: 3 })).map(([minus, factors]) => {
    const size = factors.length === 1 && factors[0] ? factors[0] : productElement(factors);
    return minus ? negateElement(size) : size;
  });
  const number = fc.integer({ min: -1000, max: 1000 }).filter((n) => n !== 0);
  return fc.oneof(
    { weight: 4, arbitrary: smooth },
    {
      weight: 3,
      arbitrary: fc
        .integer({ min: -30, max: 30 })
        .filter((n) => n !== 0)
        .map(integer),
    },
    { weight: 2, arbitrary: number.map(integer) },
    { weight: 1, arbitrary: fc.tuple(number, number).map(([a, b]) => quotientElement(integer(a), integer(b))) },
    { weight: 1, arbitrary: fc.constantFrom(integer(-1), integer(1)) },
  );
}

/** Units of 𝔽_p, written by integers of either sign and by fractions. */
export function primeFieldUnit(p: number): fc.Arbitrary<Element> {
  const number = fc.integer({ min: -3 * p, max: 3 * p }).filter((n) => n % p !== 0);
  return fc.oneof(
    { weight: 4, arbitrary: fc.integer({ min: 1, max: p - 1 }).map(integer) },
    { weight: 1, arbitrary: number.map(integer) },
    { weight: 1, arbitrary: fc.tuple(number, number).map(([a, b]) => quotientElement(integer(a), integer(b))) },
  );
}

/** Units of a field with basis the products of powers of its letters, the i-th up to its degree, over 𝔽_p. */
function extensionUnit(
  p: number,
  letters: readonly (readonly [name: string, degree: number])[],
): fc.Arbitrary<Element> {
  const basis = letters.reduce<Element[][]>(
    (products, [name, degree]) =>
      Array.from({ length: degree }, (_, e) => e).flatMap((e) =>
        products.map((b) =>
          e === 0 ? b : [...b, e === 1 ? letterElement(name) : powerElement(letterElement(name), e)],
        ),
      ),
    [[]],
  );
  return fc
    .array(fc.integer({ min: 0, max: p - 1 }), { minLength: basis.length, maxLength: basis.length })
    .filter((coefficients) => coefficients.some((c) => c !== 0))
    .map((coefficients) =>
      sumElement(coefficients.flatMap((c, i) => (c === 0 ? [] : [productElement([integer(c), ...(basis[i] ?? [])])]))),
    );
}

/** Rational functions of low degree in t with constants of the field below: polynomials, quotients and powers. */
export function functionUnit(constant: fc.Arbitrary<Element>): fc.Arbitrary<Element> {
  const t = letterElement('t');
  const coefficient = fc.oneof({ weight: 1, arbitrary: fc.constant(undefined) }, { weight: 2, arbitrary: constant });
  const polynomial = fc
    .tuple(constant, fc.array(coefficient, { minLength: 1, maxLength: 2 }))
    .map(([lead, lower]) =>
      sumElement([
        productElement([lead, lower.length === 1 ? t : powerElement(t, lower.length)]),
        ...lower.flatMap((c, i) => (c === undefined ? [] : [i === 0 ? c : productElement([c, t])])),
      ]),
    );
  const linear = constant.map((c) => sumElement([t, c]));
  const low = fc.oneof({ weight: 2, arbitrary: linear }, { weight: 1, arbitrary: fc.constant(t) });
  return fc.oneof(
    { weight: 4, arbitrary: low },
    { weight: 2, arbitrary: polynomial },
    { weight: 2, arbitrary: constant },
    { weight: 1, arbitrary: fc.tuple(low, fc.integer({ min: -2, max: 3 })).map(([f, n]) => powerElement(f, n)) },
    { weight: 1, arbitrary: fc.tuple(polynomial, low).map(([f, g]) => quotientElement(f, g)) },
    { weight: 1, arbitrary: fc.tuple(constant, low, low).map((factors) => productElement(factors)) },
  );
}

/** ± products of letters. */
export function monomialUnit(letters: readonly string[] = ['a', 'b', 'x', 'y']): fc.Arbitrary<Element> {
  const power_ = fc
    .tuple(fc.constantFrom(...letters), fc.integer({ min: -3, max: 3 }))
    .map(([name, e]) => (e === 1 ? letterElement(name) : powerElement(letterElement(name), e)));
  return fc.tuple(fc.boolean(), fc.array(power_, { minLength: 0, maxLength: 3 })).map(([minus, factors]) => {
    const size = factors.length === 0 ? integer(1) : productElement(factors);
    return minus ? negateElement(size) : size;
  });
}

const row = (name: string, unit: fc.Arbitrary<Element>, more: Partial<FieldRow> = {}): FieldRow => ({
  name,
  unit,
  conditions: [],
  sums: true,
  steinberg: true,
  canonical: true,
  label: name,
  ...more,
});

const letters = (characteristic: number): FieldRow =>
  row('any', monomialUnit(), {
    conditions: characteristic === 0 ? [] : [{ kind: 'characteristic', is: true, prime: BigInt(characteristic) }],
    sums: false,
    steinberg: false,
    label: characteristic === 0 ? 'any' : `any with char = ${characteristic}`,
  });

const prime = (p: number): FieldRow => row(`F_${p}`, primeFieldUnit(p), { steinberg: p > 2 });
const extension = (p: number, d: number): FieldRow => row(`F_${p ** d}`, extensionUnit(p, [['z', d]]));

const smallRational = fc.oneof(
  { weight: 3, arbitrary: fc.constantFrom(1, -1, 2, -2, 3, 5).map(integer) },
  { weight: 1, arbitrary: fc.constantFrom(2, 3).map((n) => quotientElement(integer(1), integer(n))) },
);

/** Units of ℚ[w]/(modulus): polynomials in w with small coefficients. */
function numberUnit(modulus: string): fc.Arbitrary<Element> {
  const degree = Number(/\^(\d)/.exec(modulus)?.[1]);
  const powers = Array.from({ length: degree }, (_, i) => powerElement(letterElement('w'), i));
  return fc
    .array(fc.oneof({ weight: 1, arbitrary: fc.constant(undefined) }, { weight: 2, arbitrary: smallRational }), {
      minLength: degree,
      maxLength: degree,
    })
    .filter((coefficients) => coefficients.some((c) => c !== undefined))
    .map((coefficients) =>
      sumElement(coefficients.flatMap((c, i) => (c === undefined ? [] : [productElement([c, powers[i]!])]))),
    );
}

/** Every kind of field the engine decides over. */
export const fieldRows: readonly FieldRow[] = [
  ...['Q', 'R', 'C'].map((name) => row(name, rationalUnit())),
  ...[2, 3, 5, 7].map((p) => row(`Q_${p}`, rationalUnit([p, p, 2, 3, 5]))),
  ...[2, 3, 5, 7, 11, 101, 1_000_003].map(prime),
  ...(
    [
      [2, 2],
      [2, 3],
      [3, 2],
      [5, 2],
      [3, 3],
    ] as const
  ).map(([p, d]) => extension(p, d)),
  row(
    'F_9[y]/(y^2+z+1)',
    extensionUnit(3, [
      ['z', 2],
      ['y', 2],
    ]),
  ),
  ...[2, 3, 7].map((p) => row(`F_${p}(t)`, functionUnit(primeFieldUnit(p)))),
  ...([2, 3] as const).map((p) => row(`F_${p * p}(t)`, functionUnit(extensionUnit(p, [['z', 2]])))),
  ...['w^2-5', 'w^2+w+1', 'w^3-2', 'w^2+7'].map((modulus) =>
    row(`Q[w]/(${modulus})`, numberUnit(modulus), { canonical: false }),
  ),
  row('Q(t)', functionUnit(smallRational), { canonical: false, open: 3 }),
  ...[0, 2, 3, 5].map(letters),
];

/** The row with a label. */
export function fieldRow(label: string): FieldRow {
  const found = fieldRows.find((candidate) => candidate.label === label);
  if (found === undefined) throw new RangeError(`no field ${label} in the table`);
  return found;
}
