import type { Field } from './field';

/**
 * Polynomials in one variable over a field: coefficients from the constant term up, the last one not zero, so that the zero
 * polynomial is the empty list and equal polynomials have equal lists. Schoolbook algorithms; the degrees here are small.
 */
export type Polynomial<E> = readonly E[];

/** The degree; −1 for zero. */
export const degree = <E>(f: Polynomial<E>): number => f.length - 1;

/** Cuts the zeros at the top off. The list given is changed and becomes the answer. */
export function trimmed<E>(field: Field<E>, coefficients: E[]): Polynomial<E> {
  while (coefficients.length > 0 && field.isZero(coefficients[coefficients.length - 1]!)) coefficients.pop();
  return coefficients;
}

/** The constant polynomial c. */
export const constant = <E>(field: Field<E>, c: E): Polynomial<E> => (field.isZero(c) ? [] : [c]);

export function addPolynomials<E>(field: Field<E>, f: Polynomial<E>, g: Polynomial<E>): Polynomial<E> {
  const [long, short] = f.length >= g.length ? [f, g] : [g, f];
  const sum = long.map((c, i) => (i < short.length ? field.add(c, short[i]!) : c));
  return trimmed(field, sum);
}

export const negatePolynomial = <E>(field: Field<E>, f: Polynomial<E>): Polynomial<E> => f.map((c) => field.negate(c));

export const subtractPolynomials = <E>(field: Field<E>, f: Polynomial<E>, g: Polynomial<E>): Polynomial<E> =>
  addPolynomials(field, f, negatePolynomial(field, g));

export function multiplyPolynomials<E>(field: Field<E>, f: Polynomial<E>, g: Polynomial<E>): Polynomial<E> {
  if (f.length === 0 || g.length === 0) return [];
  const product = new Array<E>(f.length + g.length - 1).fill(field.zero);
  for (let i = 0; i < f.length; i++) {
    const c = f[i]!;
    if (field.isZero(c)) continue;
    for (let j = 0; j < g.length; j++) product[i + j] = field.add(product[i + j]!, field.multiply(c, g[j]!));
  }
  return product;
}

export const scalePolynomial = <E>(field: Field<E>, c: E, f: Polynomial<E>): Polynomial<E> =>
  field.isZero(c) ? [] : f.map((a) => field.multiply(c, a));

export function derivativePolynomial<E>(field: Field<E>, f: Polynomial<E>): Polynomial<E> {
  return trimmed(
    field,
    f.slice(1).map((c, i) => field.multiply(field.fromInteger(BigInt(i + 1)), c)),
  );
}

/** f divided by its leading coefficient; zero stays zero. */
export function monic<E>(field: Field<E>, f: Polynomial<E>): Polynomial<E> {
  if (f.length === 0) return f;
  const lead = f[f.length - 1]!;
  return field.equal(lead, field.one) ? f : scalePolynomial(field, field.inverse(lead), f);
}

/** f = quotient · g + remainder with deg remainder < deg g. Throws a RangeError for g = 0. */
export function dividePolynomials<E>(
  field: Field<E>,
  f: Polynomial<E>,
  g: Polynomial<E>,
): { readonly quotient: Polynomial<E>; readonly remainder: Polynomial<E> } {
  if (g.length === 0) throw new RangeError('division by the zero polynomial');
  if (f.length < g.length) return { quotient: [], remainder: f };
  const lead = g[g.length - 1]!;
  const unit = field.equal(lead, field.one) ? undefined : field.inverse(lead);
  const remainder = f.slice();
  const quotient = new Array<E>(f.length - g.length + 1).fill(field.zero);
  for (let top = f.length - 1; top >= g.length - 1; top--) {
    const head = remainder[top]!;
    if (field.isZero(head)) continue;
    const c = unit === undefined ? head : field.multiply(head, unit);
    const shift = top - g.length + 1;
    quotient[shift] = c;
    for (let i = 0; i < g.length - 1; i++) {
      if (!field.isZero(g[i]!)) remainder[shift + i] = field.subtract(remainder[shift + i]!, field.multiply(c, g[i]!));
    }
  }
  remainder.length = g.length - 1;
  return { quotient, remainder: trimmed(field, remainder) };
}

export const remainderPolynomial = <E>(field: Field<E>, f: Polynomial<E>, g: Polynomial<E>): Polynomial<E> =>
  f.length < g.length ? f : dividePolynomials(field, f, g).remainder;

/** The monic greatest common divisor; zero when both are zero. */
export function gcdPolynomials<E>(field: Field<E>, f: Polynomial<E>, g: Polynomial<E>): Polynomial<E> {
  let [a, b] = [f, g];
  while (b.length > 0) [a, b] = [b, remainderPolynomial(field, a, b)];
  return monic(field, a);
}

/**
 * The inverse of f modulo m, of degree < deg m; `undefined` when f and m have a common factor.
 * Extended Euclidean algorithm: Cohen, A Course in Computational Algebraic Number Theory, Algorithm 3.2.2.
 */
export function invertPolynomial<E>(field: Field<E>, f: Polynomial<E>, m: Polynomial<E>): Polynomial<E> | undefined {
  let [r0, r1] = [m, remainderPolynomial(field, f, m)];
  let [s0, s1]: [Polynomial<E>, Polynomial<E>] = [[], [field.one]];
  while (r1.length > 0) {
    const { quotient, remainder } = dividePolynomials(field, r0, r1);
    [r0, r1] = [r1, remainder];
    [s0, s1] = [s1, subtractPolynomials(field, s0, multiplyPolynomials(field, quotient, s1))];
  }
  if (r0.length !== 1) return undefined;
  return remainderPolynomial(field, scalePolynomial(field, field.inverse(r0[0]!), s0), m);
}

/**
 * The resultant of f and g ≠ 0; for f monic the product of the values of g at the roots of f. By remainders: Res(f, g) =
 * (−1)^(deg f · deg g) lc(g)^(deg f − deg r) Res(g, r) for r = f mod g. Cohen, Algorithm 3.3.7 treats the general case.
 */
export function resultant<E>(field: Field<E>, f: Polynomial<E>, g: Polynomial<E>): E {
  let [a, b] = [f, g];
  let result = field.one;
  while (b.length > 1) {
    const r = remainderPolynomial(field, a, b);
    if (r.length === 0) return field.zero;
    const lead = b[b.length - 1]!;
    for (let i = a.length - r.length; i > 0; i--) result = field.multiply(result, lead);
    if (degree(a) % 2 === 1 && degree(b) % 2 === 1) result = field.negate(result);
    [a, b] = [b, r];
  }
  if (b.length === 0) return a.length === 1 ? field.one : field.zero;
  for (let i = degree(a); i > 0; i--) result = field.multiply(result, b[0]!);
  return result;
}

/** f(a). */
export function valueAt<E>(field: Field<E>, f: Polynomial<E>, a: E): E {
  let value = field.zero;
  for (let i = f.length - 1; i >= 0; i--) value = field.add(field.multiply(value, a), f[i]!);
  return value;
}
