import { inverseModulo, modulo } from '../arith/modular';
import type { IntegerPolynomial } from './integer-polynomial';
import type { Polynomial } from './polynomial';
import { dividePolynomials, invertPolynomial, multiplyPolynomials } from './polynomial';
import { primeField } from './prime-field';

/** f = left · right with s·left + t·right = 1, modulo a power of p; both are monic. */
interface Split {
  readonly left: Node;
  readonly right: Node;
  s: IntegerPolynomial;
  t: IntegerPolynomial;
}

interface Node {
  value: IntegerPolynomial;
  readonly split?: Split;
}

/**
 * Monic polynomials modulo p^k, coefficients 0 … p^k − 1, whose product is the monic multiple of f modulo p^k, and which are the given
 * ones modulo p; those are monic, pairwise coprime, and their product is the monic multiple of f modulo p. p does not divide the leading coefficient of f.
 *
 * Hensel's lemma in a tree of pairs, the precision doubled at each step: H. Zassenhaus, On Hensel factorization I, J. Number Theory 1 (1969); von zur
 * Gathen–Gerhard, Modern Computer Algebra, Algorithms 15.10 and 15.17 (numbers from memory).
 */
export function liftFactors(
  f: IntegerPolynomial,
  factors: readonly Polynomial<bigint>[],
  p: bigint,
  k: number,
  spend: () => void,
): readonly IntegerPolynomial[] {
  const exponents = [k];
  while (exponents[0]! > 1) exponents.unshift((exponents[0]! + (exponents[0]! & 1)) / 2);
  const tree = grown(factors, p);
  exponents.slice(1).forEach((exponent, i) => {
    const m = p ** BigInt(exponent);
    const inverse = inverseModulo(f[f.length - 1]!, m);
    tree.value = f.map((c) => modulo(c * inverse, m));
    lift(tree, m, i < exponents.length - 2, spend);
  });
  if (k === 1) return factors;
  return leaves(tree);
}

/** The tree modulo p, halves of about the same degree. */
function grown(factors: readonly Polynomial<bigint>[], p: bigint): Node {
  const field = primeField(p);
  const node = (list: readonly Polynomial<bigint>[]): Node => {
    if (list.length === 1) return { value: list[0]! };
    const total = list.reduce((sum, g) => sum + g.length - 1, 0);
    let middle = 1;
    for (let sum = list[0]!.length - 1; middle < list.length - 1; middle++) {
      const next = sum + list[middle]!.length - 1;
      if (2 * next > total) break;
      sum = next;
    }
    const left = node(list.slice(0, middle));
    const right = node(list.slice(middle));
    const s = invertPolynomial(field, left.value, right.value);
    if (s === undefined) throw new Error('the factors to be lifted are not coprime');
    // t = (1 − s·left)/right
    const rest = multiplyPolynomials(field, s, left.value).map((c) => field.negate(c));
    rest[0] = field.add(rest[0] ?? 0n, 1n);
    const t = dividePolynomials(field, rest, right.value).quotient;
    return { value: multiplyPolynomials(field, left.value, right.value), split: { left, right, s, t } };
  };
  return node(factors);
}

const leaves = (node: Node): readonly IntegerPolynomial[] =>
  node.split === undefined ? [node.value] : [...leaves(node.split.left), ...leaves(node.split.right)];

/** Brings the factors below a node, whose value is right modulo m, from a modulus whose square m divides to m. */
function lift(node: Node, m: bigint, again: boolean, spend: () => void): void {
  const { split } = node;
  if (split === undefined) return;
  const { left, right, s, t } = split;
  const error = reduced(subtract(node.value, product(left.value, right.value, spend)), m);
  const { quotient, remainder } = divided(product(s, error, spend), right.value, m, spend);
  // left + t·error + quotient·left, modulo m of the degree of left
  left.value = reduced(sum(left.value, sum(product(t, error, spend), product(quotient, left.value, spend))), m);
  right.value = reduced(sum(right.value, remainder), m);
  if (again) {
    const defect = sum(product(s, left.value, spend), product(t, right.value, spend)).slice();
    defect[0] = (defect[0] ?? 0n) - 1n;
    const b = reduced(defect, m);
    const step = divided(product(s, b, spend), right.value, m, spend);
    split.s = reduced(subtract(s, step.remainder), m);
    split.t = reduced(subtract(t, sum(product(t, b, spend), product(step.quotient, left.value, spend))), m);
  }
  lift(left, m, again, spend);
  lift(right, m, again, spend);
}

function product(f: IntegerPolynomial, g: IntegerPolynomial, spend: () => void): IntegerPolynomial {
  if (f.length === 0 || g.length === 0) return [];
  const result = new Array<bigint>(f.length + g.length - 1).fill(0n);
  for (let i = 0; i < f.length; i++) {
    const c = f[i]!;
    spend();
    for (let j = 0; j < g.length; j++) result[i + j]! += c * g[j]!;
  }
  return result;
}

function sum(f: IntegerPolynomial, g: IntegerPolynomial): IntegerPolynomial {
  return f.length >= g.length ? f.map((c, i) => c + (g[i] ?? 0n)) : sum(g, f);
}

const subtract = (f: IntegerPolynomial, g: IntegerPolynomial): IntegerPolynomial =>
  sum(
    f,
    g.map((c) => -c),
  );

function reduced(f: IntegerPolynomial, m: bigint): IntegerPolynomial {
  const result = f.map((c) => modulo(c, m));
  while (result.length > 0 && result[result.length - 1] === 0n) result.pop();
  return result;
}

/** Quotient and remainder modulo m by a monic g. */
function divided(
  f: IntegerPolynomial,
  g: IntegerPolynomial,
  m: bigint,
  spend: () => void,
): { readonly quotient: IntegerPolynomial; readonly remainder: IntegerPolynomial } {
  const n = g.length - 1;
  const rest = f.slice();
  const quotient = new Array<bigint>(f.length > n ? f.length - n : 0).fill(0n);
  for (let top = f.length - 1; top >= n; top--) {
    const c = modulo(rest[top]!, m);
    quotient[top - n] = c;
    if (c === 0n) continue;
    spend();
    for (let j = 0; j < n; j++) rest[top - n + j]! -= c * g[j]!;
  }
  if (rest.length > n) rest.length = n;
  return { quotient: reduced(quotient, m), remainder: reduced(rest, m) };
}
