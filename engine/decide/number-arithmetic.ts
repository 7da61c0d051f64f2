import type { Budget } from '../arith/budget';
import { limitedBudget, unlessExhausted } from '../arith/limited-budget';
import { addInt, isOddInt, multiplyInt, negateInt, type Int } from '../arith/int';
import { primitiveOfRational } from '../field/integer-polynomial';
import type { NumberField, NumberFieldElement } from '../field/number-field';
import { isProductOne } from '../field/number-field-products';
import { isSquareInNumberField } from '../field/number-field-squares';
import { SIZE_LIMIT, tooLarge } from '../field/read-element';
import { realRoots, type RealRoot } from '../field/real-roots';
import { tameSymbolsVanish, type WeightedSymbol } from '../place/number-prime';
import { FinitePlaces, splitsAtFinitePlaces } from '../place/number-symbols';
import { unitPower } from '../place/unit-power';
import { bitsOf, symbolPairs } from '../ring/witt-symbol-ring';
import { lettersOf, type Words } from '../ring/word-ring';
import { vanishesBySteinberg } from './number-steinberg';

/** Steps that looking at tame symbols may take. */
const TAME_STEPS = 50_000;

/** What is asked about products of generators of units of a number field; masks say which generators are taken. */
export class NumberArithmetic {
  private readonly products = new Map<bigint, NumberFieldElement>();
  private readonly squares = new Map<bigint, boolean>();
  private roots: readonly RealRoot[] | undefined;
  private readonly places: FinitePlaces;
  private readonly signs = new Map<RealRoot, (boolean | undefined)[]>();

  constructor(
    private readonly field: NumberField,
    private readonly generators: readonly NumberFieldElement[],
    private readonly budget: Budget,
  ) {
    this.places = new FinitePlaces(field, budget);
  }

  /** For each real place, in the order of the real roots of the modulus, whether a product is negative there. */
  get realPlaces(): readonly ((mask: bigint) => boolean)[] {
    this.roots ??= realRoots(primitiveOfRational(this.field.modulus).primitive, this.budget);
    return this.roots.map((root) => (mask) => bitsOf(mask).filter((i) => this.isNegative(root, i)).length % 2 === 1);
  }

  private isNegative(root: RealRoot, i: number): boolean {
    const known = this.signs.get(root) ?? [];
    this.signs.set(root, known);
    const { unit, primitive } = primitiveOfRational(this.generators[i]!);
    return (known[i] ??= root.signOf(primitive) < 0 !== unit.num < 0n);
  }

  product(mask: bigint): NumberFieldElement {
    const known = this.products.get(mask);
    if (known !== undefined) return known;
    const made = bitsOf(mask).reduce((a, i) => this.field.multiply(a, this.generators[i]!), this.field.one);
    this.products.set(mask, made);
    return made;
  }

  isSquare(mask: bigint): boolean {
    const known = this.squares.get(mask);
    if (known !== undefined) return known;
    const found = mask === 0n || isSquareInNumberField(this.field, this.product(mask), this.budget);
    this.squares.set(mask, found);
    return found;
  }

  /** Whether a formal sum of symbols is zero in the Brauer group, at all finite places. */
  splits(symbols: bigint): boolean {
    const partners = new Map<number, bigint>();
    for (const [i, j] of symbolPairs(symbols)) partners.set(j, (partners.get(j) ?? 0n) ^ (1n << BigInt(i)));
    const pairs = [...partners]
      .map(([j, mask]) => [this.product(mask), this.generators[j]!] as const)
      .filter(([a, b]) => !this.field.equal(a, this.field.one) && !this.field.equal(b, this.field.one));
    return pairs.length === 0 || splitsAtFinitePlaces(this.places, pairs);
  }

  /** Whether the tame symbols of words of degree 2 in the generators vanish; also when that takes too long to say. */
  tameSymbolsVanish(words: Words): boolean {
    const symbols: WeightedSymbol[] = [];
    for (const [mask, { x }] of words) {
      const entries = lettersOf(mask).map((i) => this.generators[i + 1]!);
      // words with η vanish modulo η
      if (x === 0n || entries.length > 2) continue;
      const [a = this.generators[0]!, b = this.generators[0]!] = entries;
      symbols.push({ coefficient: x, a, b: entries.length === 1 ? this.generators[0]! : b });
    }
    const limited = limitedBudget(this.budget, TAME_STEPS);
    return unlessExhausted(
      () => tameSymbolsVanish(this.field, symbols, limited),
      () => true,
    );
  }

  /** Whether words in the generators are seen to be 0 in Milnor K-theory. */
  vanishesBySteinberg(words: Words, degree: number): boolean {
    return vanishesBySteinberg(words, degree, this.field, this.generators, this.budget);
  }

  /** About how many binary digits a product of powers of generators has. */
  bits(exponents: ReadonlyMap<number, Int>): bigint {
    let bits: Int = 0;
    for (const [i, e] of exponents) {
      const size = (this.field.size?.(this.generators[i]!) ?? 1) + 32 - Math.clz32(this.field.modulus.length);
      bits = addInt(bits, multiplyInt(e < 0 ? negateInt(e) : e, size));
    }
    return BigInt(bits);
  }

  maskBits(mask: bigint): bigint {
    return this.bits(new Map(bitsOf(mask).map((i) => [i, 1])));
  }

  /** A product of powers of generators. Refused when it has more than 10⁵ digits. */
  unit(exponents: ReadonlyMap<number, Int>): NumberFieldElement {
    if (this.bits(exponents) > SIZE_LIMIT) throw tooLarge(undefined);
    let value = this.field.one;
    for (const [i, e] of exponents)
      if (e !== 0) value = this.field.multiply(value, unitPower(this.field, this.generators[i]!, e));
    return value;
  }

  isOne(exponents: ReadonlyMap<number, Int>): boolean {
    if (this.bits(exponents) > SIZE_LIMIT) throw tooLarge(undefined);
    const factors = [...exponents].map(([i, e]) => [this.generators[i]!, e] as const);
    return isProductOne(this.field, factors, this.budget);
  }
}

/** The mask of the generators with an odd exponent. */
export function oddMask(exponents: readonly Int[]): bigint {
  let mask = 0n;
  for (let i = 0; i < exponents.length; i += 2)
    if (isOddInt(exponents[i + 1] ?? 0)) mask ^= 1n << BigInt(exponents[i] ?? 0);
  return mask;
}
