import type { Element } from '../expression/element';
import { angle, symbol, type Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import type { NumberField, NumberFieldElement } from '../field/number-field';
import { differenceIn } from '../ring/residue-class-quotients';
import { wittSymbolRing, type WittSymbols } from '../ring/witt-symbol-ring';
import { countBits, lettersOf, type Words } from '../ring/word-ring';
import { etaFactors, multiple, total } from '../ring/write-word';
import { oddMask, type NumberArithmetic } from './number-arithmetic';
import type { NumberClasses, NumberUnit } from './number-classes';
import type { NumberValue } from './number-value';
import { isZeroModCube } from './number-zero';

/** coefficient · η^eta · [symbols] · ⟨angle⟩. */
export interface FieldWord<E> {
  readonly coefficient: bigint;
  readonly eta: number;
  readonly symbols: readonly E[];
  readonly angle?: E;
}

/** A word over a number field. */
export type NumberWord = FieldWord<NumberFieldElement>;

/**
 * Words that add up to the part of degree n of a class over a number field. Where it is 0, [u], n·1 + ⟨d⟩ or ηᵏ times that, it is given so;
 * otherwise in canonical words of the generators of its units, which are no canonical form over the number field. Refused when that
 * takes too many words.
 */
export function numberWords<A, B extends NumberUnit>(
  value: NumberValue<A, B>,
  degree: number,
  classes: NumberClasses<A, B>,
  arithmetic: NumberArithmetic,
): readonly NumberWord[] {
  const words = wordsOf(value, degree, classes, arithmetic);
  if (words === 'too long')
    throw new Refusal('size', 'A class over a number field has too many words to be written. Use smaller words.');
  return words;
}

/** The part of degree n of a class over a number field as it is shown: by these words, or unsimplified where they are too many. */
export function writeNumberClass<A, B extends NumberUnit>(
  value: NumberValue<A, B>,
  degree: number,
  classes: NumberClasses<A, B>,
  arithmetic: NumberArithmetic,
): Expression {
  const words = wordsOf(value, degree, classes, arithmetic);
  return words === 'too long' ? value.expression(degree) : writeWords(words, (a) => classes.field.write(a));
}

function wordsOf<A, B extends NumberUnit>(
  value: NumberValue<A, B>,
  degree: number,
  { field, generators }: NumberClasses<A, B>,
  arithmetic: NumberArithmetic,
): readonly NumberWord[] | 'too long' {
  const short =
    degree === 1
      ? asSymbol(value, field, arithmetic)
      : degree < 1
        ? asForm(value, degree, field, arithmetic)
        : undefined;
  if (short !== undefined) return short;
  const words = value.words(degree);
  return words === 'too long' ? words : words === undefined ? [] : spelled(words, degree, generators);
}

/** The words as they are written, with `prefix` in front of each. */
export const writeWords = <E>(
  words: readonly FieldWord<E>[],
  write: (a: E) => Element,
  prefix: readonly Expression[] = [],
): Expression =>
  total(
    words.map((word) =>
      multiple(word.coefficient, [
        ...etaFactors(word.eta),
        ...prefix,
        ...word.symbols.map((a) => symbol([write(a)])),
        ...(word.angle === undefined ? [] : [angle([write(word.angle)])]),
      ]),
    ),
  );

/** Canonical words in generators, by their letters; generator 0 is −1 and generator i is letter i − 1. */
export function spelled<E>(words: Words, degree: number, generators: readonly E[]): readonly FieldWord<E>[] {
  const minusOne = generators[0]!;
  return [...words].flatMap(([mask, { x, y }]): readonly FieldWord<E>[] => {
    const own = degree - countBits(mask);
    const tail = lettersOf(mask).map((i) => generators[i + 1]!);
    const signs = Array.from({ length: own > 0 ? own : 0 }, () => minusOne);
    const plain = x === 0n ? [] : [{ coefficient: x, eta: own < 0 ? -own : 0, symbols: [...signs, ...tail] }];
    return y === 0n ? plain : [...plain, { coefficient: y, eta: 1, symbols: [minusOne, ...tail] }];
  });
}

/** Entries of a short form have at most so many binary digits. */
const SHORT = 2_000n;

const ring = wittSymbolRing<bigint>((mask) => mask);
const nothing: WittSymbols = { rank: 0, determinant: 0n, symbols: 0n };

/** Whether a value less a form of degree ≤ 1 is zero in the Witt ring, by what the form is modulo I³ and its signatures. */
function agrees<A, B extends NumberUnit>(
  value: NumberValue<A, B>,
  degree: number,
  form: WittSymbols | undefined,
  signatures: readonly bigint[],
  arithmetic: NumberArithmetic,
): boolean {
  return (
    value.signatures(degree).every((s, i) => s === signatures[i]) &&
    isZeroModCube(differenceIn(ring, degree, value.witt(degree), form), arithmetic)
  );
}

/** [u], if the class of degree 1 is that. */
function asSymbol<A, B extends NumberUnit>(
  value: NumberValue<A, B>,
  field: NumberField,
  arithmetic: NumberArithmetic,
): readonly NumberWord[] | undefined {
  const exponents = value.unit();
  if (arithmetic.bits(exponents) > SHORT) return undefined;
  const mask = oddMask([...exponents].flat());
  const signatures = arithmetic.realPlaces.map((isNegative) => (isNegative(mask) ? -2n : 0n));
  if (!agrees(value, 1, ring.symbol(mask), signatures, arithmetic)) return undefined;
  const unit = arithmetic.unit(exponents);
  return field.equal(unit, field.one) ? [] : [{ coefficient: 1n, eta: 0, symbols: [unit] }];
}

/** ηᵏ(n + ⟨d⟩) or ηᵏn, if the class of degree −k ≤ 0 is that, with small n for k > 0. */
function asForm<A, B extends NumberUnit>(
  value: NumberValue<A, B>,
  degree: number,
  field: NumberField,
  arithmetic: NumberArithmetic,
): readonly NumberWord[] | undefined {
  const eta = degree < 0 ? -degree : 0;
  const plain = (n: bigint): readonly NumberWord[] => (n === 0n ? [] : [{ coefficient: n, eta, symbols: [] }]);
  const { realPlaces } = arithmetic;
  for (const n of multiples(value, degree)) {
    const signatures = realPlaces.map(() => n);
    if (agrees(value, degree, ring.integer(n), signatures, arithmetic)) return plain(n);
  }
  for (const n of multiples(value, degree).map((rank) => rank - 1n)) {
    const rest = differenceIn(ring, degree, value.witt(degree), ring.integer(n));
    if (rest === undefined || rest.rank % 2 === 0) continue;
    const mask = rest.rank % 4 === 3 ? rest.determinant ^ 1n : rest.determinant;
    const form = ring.add(degree, ring.integer(n) ?? nothing, { rank: 1, determinant: mask, symbols: 0n });
    const signatures = realPlaces.map((isNegative) => n + (isNegative(mask) ? -1n : 1n));
    if (arithmetic.maskBits(mask) > SHORT || !agrees(value, degree, form, signatures, arithmetic)) continue;
    const unit = arithmetic.product(mask);
    if (field.equal(unit, field.one)) return plain(n + 1n);
    return [...plain(n), { coefficient: 1n, eta, symbols: [], angle: unit }];
  }
  return undefined;
}

/** The ranks of forms to compare a class with: its own in degree 0, otherwise by a signature, or small ones. */
function multiples<A, B extends NumberUnit>(value: NumberValue<A, B>, degree: number): readonly bigint[] {
  if (degree === 0) return [value.rank()];
  const [s] = value.signatures(degree);
  return s === undefined ? [0n, 1n, 2n, 3n, 4n] : [s, s + 2n];
}
