import type { Budget } from '../arith/budget';
import { bitLength } from '../arith/bits';
import { negateInt } from '../arith/int';
import { integerElement } from '../expression/element';
import { symbol, type Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import { rationals, type Rational } from '../field/rational';
import { exponentMap, type RationalEntry } from '../place/rational-entry';
import { see, type BaseElement } from '../place/sight';
import { evaluate } from '../ring/evaluate';
import type { GradedRing } from '../ring/graded-ring';
import { productRing, type ProductClass } from '../ring/product-ring';
import { minusOneElement, multiple, symbolFactors, total } from '../ring/write-word';
import type { Finding } from './finding';
import type { RationalStatement } from './rational-statement';

/** Products up to this many binary digits are written as one number, larger ones by their factors. */
const WRITTEN_BITS = 4096n;

/** A product past this size is not written out: 10⁵ digits. */
const LARGEST_BITS = 332_193n;

const productsRing = (): GradedRing<RationalEntry, ProductClass> =>
  productRing((entry) => ({ negative: entry.negative, exponents: exponentMap(entry) }));

/** The classes in K^M_1 of the sides of a statement with rational entries, and the base their exponents belong to. */
export function productClasses(
  { sides, entries }: RationalStatement,
  budget: Budget,
): { readonly base: readonly BaseElement[]; readonly products: readonly (ProductClass | undefined)[] } {
  const base = see(entries, 'none', budget);
  const ring = productsRing();
  return { base, products: sides.map((terms) => evaluate(terms, ring, budget).get(1)) };
}

/** Degree 1 modulo η: the products of the entries in F^×, F a field with exactly the rational numbers as entries. */
export function productFinding(statement: RationalStatement, target: string, budget: Budget): Finding {
  const { base, products } = productClasses(statement, budget);
  const [left, right] = products;
  const ring = productsRing();
  const same = left === undefined || right === undefined ? left === right : ring.equal(1, left, right);
  return {
    map: 'product',
    degree: 1,
    same,
    zero: left === undefined && right === undefined,
    sameModEta: same,
    sameModH: true,
    left: () => writeProduct(base, left),
    right: () => writeProduct(base, right),
    target: () => target,
    reason: () => 'The products of the entries are different numbers.',
  };
}

function writeProduct(base: readonly BaseElement[], value: ProductClass | undefined): Expression {
  if (value === undefined || value.kind === 'integer') return total([]);
  if (sizeOf(base, value) <= WRITTEN_BITS) return symbol([rationals.write(productValue(base, value))]);
  const words = [...value.exponents].map(([i, e]) =>
    multiple(BigInt(e), [symbol([integerElement(base[i]?.value ?? 1n)])]),
  );
  return total(value.sign === 0 ? words : [...symbolFactors(minusOneElement, 1), ...words]);
}

/** The rational number a class of K^M_1 stands for; refused when it is too long to write. */
export function productValue(base: readonly BaseElement[], value: ProductClass | undefined): Rational {
  if (value === undefined || value.kind === 'integer') return rationals.one;
  if (sizeOf(base, value) > LARGEST_BITS)
    throw new Refusal('size', 'The product of the entries has more than 100 000 digits. Use smaller coefficients.');
  let [num, den] = [value.sign === 0 ? 1n : -1n, 1n];
  for (const [i, e] of value.exponents) {
    const b = base[i]?.value ?? 1n;
    if (e > 0) num *= b ** BigInt(e);
    else den *= b ** BigInt(negateInt(e));
  }
  return { num, den };
}

/** An upper bound for the binary digits of the product, to compare with the limits above. */
function sizeOf(base: readonly BaseElement[], value: ProductClass & { kind: 'unit' }): bigint {
  let bits = 0n;
  for (const [i, e] of value.exponents)
    bits += BigInt(e < 0 ? negateInt(e) : e) * BigInt(bitLength(base[i]?.value ?? 1n));
  return bits;
}
