import type { Element } from '../expression/element';
import { angle, symbol, type Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import { differenceIn } from '../ring/residue-class-quotients';
import { wittSymbolRing, type WittSymbols } from '../ring/witt-symbol-ring';
import { etaFactors, multiple, total, zeroExpression } from '../ring/write-word';
import { writeWords } from './letters-words';
import type { NumberField } from '../field/number-field';
import { oddMask, type NumberArithmetic } from './number-arithmetic';
import type { NumberClasses, NumberUnit } from './number-classes';
import type { NumberValue } from './number-value';
import { isZeroModCube } from './number-zero';

/**
 * A class of K^MW_n of a number field in words that equal it. Where it is [u], n·1 + ⟨d⟩ or ηᵏ times that, or 0, it is written so; otherwise in
 * canonical words of the generators of its units, which are no canonical form over the number field. Refused when that takes too many
 * words.
 */
export function writeNumberClass<A, B extends NumberUnit>(
  value: NumberValue<A, B>,
  degree: number,
  { field, generators }: NumberClasses<A, B>,
  arithmetic: NumberArithmetic,
): Expression {
  const short = degree === 1 ? asSymbol(value, field, arithmetic) : degree < 1 ? asForm(value, degree, field, arithmetic) : undefined;
  if (short !== undefined) return short;
  const words = value.words(degree);
  if (words === undefined) return zeroExpression;
  if (words === 'too long')
    throw new Refusal('size', 'A class over a number field has too many words to be written. Use smaller words.');
  const letters = generators.slice(1).map((a): Element => field.write(a));
  return writeWords(letters, degree, words);
}

/** Entries of a short form have at most so many binary digits. */
const SHORT = 2_000n;

const ring = wittSymbolRing<bigint>((mask) => mask);

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
): Expression | undefined {
  const exponents = value.unit();
  if (arithmetic.bits(exponents) > SHORT) return undefined;
  const mask = oddMask([...exponents].flat());
  const signatures = arithmetic.realPlaces.map((isNegative) => (isNegative(mask) ? -2n : 0n));
  if (!agrees(value, 1, ring.symbol(mask), signatures, arithmetic)) return undefined;
  const unit = arithmetic.unit(exponents);
  return field.equal(unit, field.one) ? zeroExpression : symbol([field.write(unit)]);
}

/** ηᵏ(n + ⟨d⟩) or ηᵏn, if the class of degree −k ≤ 0 is that, with small n for k > 0. */
function asForm<A, B extends NumberUnit>(
  value: NumberValue<A, B>,
  degree: number,
  field: NumberField,
  arithmetic: NumberArithmetic,
): Expression | undefined {
  const etas = etaFactors(-degree);
  const plain = (n: bigint): readonly Expression[] => (n === 0n ? [] : [multiple(n, etas)]);
  const { realPlaces } = arithmetic;
  for (const n of multiples(value, degree)) {
    if (agrees(value, degree, ring.integer(n), realPlaces.map(() => n), arithmetic)) return total(plain(n));
  }
  for (const n of multiples(value, degree).map((rank) => rank - 1n)) {
    const rest = differenceIn(ring, degree, value.witt(degree), ring.integer(n));
    if (rest === undefined || rest.rank % 2 === 0) continue;
    const mask = rest.rank % 4 === 3 ? rest.determinant ^ 1n : rest.determinant;
    const form = ring.add(degree, ring.integer(n) ?? nothing, { rank: 1, determinant: mask, symbols: 0n });
    const signatures = realPlaces.map((isNegative) => n + (isNegative(mask) ? -1n : 1n));
    if (arithmetic.maskBits(mask) > SHORT || !agrees(value, degree, form, signatures, arithmetic)) continue;
    const unit = arithmetic.product(mask);
    const one = field.equal(unit, field.one);
    return one ? total(plain(n + 1n)) : total([...plain(n), multiple(1n, [...etas, angle([field.write(unit)])])]);
  }
  return undefined;
}

const nothing: WittSymbols = { rank: 0, determinant: 0n, symbols: 0n };

/** The ranks of forms to compare a class with: its own in degree 0, otherwise by a signature, or small ones. */
function multiples<A, B extends NumberUnit>(value: NumberValue<A, B>, degree: number): readonly bigint[] {
  if (degree === 0) return [value.rank()];
  const [s] = value.signatures(degree);
  return s === undefined ? [0n, 1n, 2n, 3n, 4n] : [s, s + 2n];
}
