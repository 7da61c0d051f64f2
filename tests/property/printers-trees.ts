import fc from 'fast-check';
import {
  type Element,
  integerElement,
  letterElement,
  negateElement,
  powerElement,
  productElement,
  quotientElement,
  sumElement,
} from '@/engine/expression/element';
import {
  angle,
  epsilon,
  epsilonInteger,
  eta,
  type Expression,
  hyperbolic,
  integer,
  negate,
  pfister,
  power,
  product,
  sum,
  symbol,
} from '@/engine/expression/expression';
import type { FieldName } from '@/engine/expression/field-name';
import type { Condition, Statement } from '@/engine/expression/statement';

/** Letters in every form: plain, with an index, with primes. `h` is a letter inside brackets. */
export const writtenLetter = fc
  .tuple(
    fc.constantFrom(...'abchtuvwxyzABQF'),
    fc.option(fc.nat({ max: 120 }).map(String), { nil: '' }),
    fc.constantFrom('', '', '', "'", "''"),
  )
  .map((parts) => parts.join(''));

const natural = fc.oneof(fc.nat({ max: 12 }).map(BigInt), fc.bigInt({ min: 0n, max: 10n ** 30n }));

/** Every tree of a field element that a text can have: sums and products of two or more, integers not negative. */
export const writtenElement: fc.Arbitrary<Element> = fc.letrec<{ element: Element }>((tie) => ({
  element: fc.oneof(
    { maxDepth: 4, depthSize: 'small', withCrossShrink: true },
    natural.map((value) => integerElement(value)),
    writtenLetter.map((name) => letterElement(name)),
    tie('element').map((of) => negateElement(of)),
    fc.array(tie('element'), { minLength: 2, maxLength: 4 }).map((terms) => sumElement(terms)),
    fc.array(tie('element'), { minLength: 2, maxLength: 4 }).map((factors) => productElement(factors)),
    fc.tuple(tie('element'), tie('element')).map(([a, b]) => quotientElement(a, b)),
    fc.tuple(tie('element'), fc.integer({ min: -10_000, max: 10_000 })).map(([a, n]) => powerElement(a, n)),
  ),
})).element;

const entries = fc.array(writtenElement, { minLength: 1, maxLength: 3 });

/** Every tree of a word that a text can have. */
export const writtenExpression: fc.Arbitrary<Expression> = fc.letrec<{ expression: Expression }>((tie) => ({
  expression: fc.oneof(
    { maxDepth: 4, depthSize: 'small', withCrossShrink: true },
    natural.map((value) => integer(value)),
    entries.map((list) => symbol(list)),
    entries.map((list) => angle(list)),
    entries.map((list) => pfister(list)),
    fc.constantFrom(eta(), hyperbolic(), epsilon()),
    fc.bigInt({ min: -50n, max: 50n }).map((count) => epsilonInteger(count)),
    tie('expression').map((of) => negate(of)),
    fc.array(tie('expression'), { minLength: 2, maxLength: 4 }).map((terms) => sum(terms)),
    fc.array(tie('expression'), { minLength: 2, maxLength: 4 }).map((factors) => product(factors)),
    fc.tuple(tie('expression'), fc.nat({ max: 64 })).map(([base, n]) => power(base, n)),
  ),
})).expression;

export const writtenCondition: fc.Arbitrary<Condition> = fc.oneof(
  fc
    .tuple(fc.constantFrom('equal' as const, 'unequal' as const), writtenElement, writtenElement)
    .map(([kind, left, right]) => ({ kind, left, right })),
  fc
    .tuple(fc.boolean(), fc.nat({ max: 100 }).map(BigInt))
    .map(([is, prime]) => ({ kind: 'characteristic' as const, is, prime })),
);

export const writtenStatement: fc.Arbitrary<Statement> = fc.record({
  sides: fc.array(writtenExpression, { minLength: 1, maxLength: 3 }),
  conditions: fc.array(writtenCondition, { maxLength: 2 }),
});

/** Names of fields of every shape; the arithmetic behind them need not make sense. */
export const writtenFieldName: fc.Arbitrary<FieldName> = fc.letrec<{ field: FieldName }>((tie) => ({
  field: fc.oneof(
    { maxDepth: 3, depthSize: 'small' },
    fc.constantFrom<FieldName>({ kind: 'rationals' }, { kind: 'reals' }, { kind: 'complexes' }, { kind: 'any' }),
    natural.map((prime): FieldName => ({ kind: 'padics', prime })),
    natural.map((order): FieldName => ({ kind: 'finite', order })),
    fc.tuple(tie('field'), writtenLetter).map(([base, letter]): FieldName => ({ kind: 'functions', base, letter })),
    fc
      .tuple(tie('field'), writtenLetter, writtenElement)
      .map(([base, letter, modulus]): FieldName => ({ kind: 'extension', base, letter, modulus })),
  ),
})).field;

/** The same value without the places where its nodes stand in a text. */
export function withoutPlaces<T>(value: T): T {
  if (Array.isArray(value)) return value.map((item: unknown) => withoutPlaces(item)) as T;
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value).flatMap(([key, item]) => (key === 'at' ? [] : [[key, withoutPlaces(item as unknown)]])),
  ) as T;
}
