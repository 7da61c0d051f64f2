import { describe, expect, it } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { factorPrimitive } from '@/engine/field/factor-rational';
import { primitiveOfRational, type IntegerPolynomial } from '@/engine/field/integer-polynomial';
import { numberField, type NumberField, type NumberFieldElement } from '@/engine/field/number-field';
import { realRoots } from '@/engine/field/real-roots';
import { rational } from '@/engine/field/rational';
import { tameSymbolsVanish } from '@/engine/place/number-prime';
import { FinitePlaces, splitsAtFinitePlaces, symbolSum } from '@/engine/place/number-symbols';
import { gpLines } from './arith-gp';

const stream = seeded(909);
const random = (low: bigint, high: bigint) => randomBetween(low, high, stream);
const list = <T>(n: number, make: (i: number) => T): T[] => Array.from({ length: n }, (_, i) => make(i));
const spelled = (f: IntegerPolynomial): string => f.map((c, i) => `(${c})*y^${i}`).join('+');

/** Splitting of 2 that is chosen: one place, several, ramified, unramified, 2 dividing the index. */
const chosen: readonly bigint[][] = [
  [1n, 0n, 1n],
  [2n, 0n, 1n],
  [-5n, 0n, 1n],
  [-17n, 0n, 1n], // 2 splits and divides the index
  [-7n, 0n, 1n],
  [15n, 0n, 1n],
  [6n, -1n, 1n],
  [8n, -2n, 1n, 1n], // R. Dedekind's field: 2 splits completely and divides every index
  [-2n, 0n, 0n, 1n],
  [-175n, 0n, 0n, 1n],
  [1n, 0n, 0n, 0n, 1n],
  [2n, 0n, 0n, 0n, 1n],
  [1n, 1n, 1n, 1n, 1n],
  [1n, 0n, -10n, 0n, 1n],
  [17n, 0n, 0n, 0n, 1n],
  [-44n, 0n, 1n],
  [-20n, 0n, 0n, 1n],
  [2n, 2n, 0n, 0n, 0n, 1n],
  [1n, 0n, 0n, 1n, 0n, 0n, 1n],
];

function drawField(d: number): IntegerPolynomial {
  for (;;) {
    const f = [...list(d, () => random(-9n, 9n)), 1n];
    const [first, second] = f[0] === 0n ? [] : factorPrimitive(f, unlimited);
    if (first?.exponent === 1 && second === undefined) return f;
  }
}

/** Moduli that are not integral. */
const fractional = [
  [rational(1n, 3n), rational(0n), rational(1n)],
  [rational(-5n, 4n), rational(0n), rational(1n)],
  [rational(3n, 2n), rational(1n, 6n), rational(1n)],
  [rational(7n, 8n), rational(-1n, 2n), rational(0n), rational(1n)],
  [rational(2n, 9n), rational(0n), rational(1n, 3n), rational(5n), rational(1n)],
];

const fields: readonly NumberField[] = [
  ...[...chosen, ...list(24, (i) => drawField(2 + (i % 4)))].map((f) => f.map((c) => rational(c))),
  ...fractional,
].map((f) => numberField('y', f));

/** Elements with zeros at small primes more often than others. */
function drawElement(field: NumberField): NumberFieldElement {
  for (;;) {
    const scale = random(0n, 2n) === 0n ? 2n : 1n;
    const a = list(field.modulus.length - 1, () => rational(random(-9n, 9n) * scale));
    while (a.length > 0 && a[a.length - 1]!.num === 0n) a.pop();
    if (a.length > 0) return a;
  }
}

const numerators = (a: NumberFieldElement): IntegerPolynomial => a.map(({ num }) => num);

describe('Hilbert symbols of number fields', () => {
  it('are those of PARI/GP nfhilbert, at dyadic places and primes that divide the index too', () => {
    const primes = [2n, 3n, 5n, 7n];
    const cases = fields.flatMap((field) => {
      const pairs = list(10, () => [drawElement(field), drawElement(field)] as const);
      return primes.map((p) => ({ field, p, pairs }));
    });
    const lines = gpLines(
      cases
        .map(({ field, p, pairs }) => {
          const integral = (a: NumberFieldElement): string => {
            const { numerator, denominator } = field.model.integral(a);
            return `(${spelled(numerator)})/${denominator}`;
          };
          const vector = pairs.map(([a, b]) => `[${integral(a)},${integral(b)}]`).join(',');
          const symbols = 'apply(c->nfhilbert(nf,c[1],c[2],q),v)';
          return `nf=nfinit(${spelled(field.model.modulus)});v=[${vector}];print(vecsort(apply(q->[q.e,q.f,${symbols}],idealprimedec(nf,${p}))))`;
        })
        .join('\n'),
    );
    const seen = { several: 0, index: 0, ramified: 0, nontrivial: 0 };
    cases.forEach(({ field, p, pairs }, i) => {
      const finite = new FinitePlaces(field, unlimited);
      const sums = pairs.map((pair) => symbolSum(finite, [pair]));
      const places = finite.at(p);
      const mine = places.map((place) => [
        place.prime.ramification,
        place.prime.residueDegree,
        sums.map((sum) => (sum.at(place) === 1 ? -1 : 1)),
      ]);
      if (p === 2n && places.length > 1) seen.several++;
      if (places[0]!.prime.generator === undefined) seen.index++;
      if (p === 2n && places.some(({ prime }) => prime.ramification > 1)) seen.ramified++;
      if (JSON.stringify(mine).includes('-1')) seen.nontrivial++;
      const theirs = JSON.parse(lines[i]!) as unknown[];
      const sorted = (rows: unknown[]): string[] => rows.map((row) => JSON.stringify(row)).sort();
      expect(sorted(mine), `${field.name} at ${p}`).toEqual(sorted(theirs));
    });
    for (const count of Object.values(seen)) expect(count).toBeGreaterThan(5);
  });

  it('multiply to 1 with those at the real places, and [a][1 − a], [a][−a] and norms have none', () => {
    for (const field of fields) {
      const places = new FinitePlaces(field, unlimited);
      const roots = realRoots(primitiveOfRational(field.modulus).primitive, unlimited);
      for (const [a, b] of list(4, () => [drawElement(field), drawElement(field)] as const)) {
        const sum = symbolSum(places, [[a, b]]);
        const primes = new Set([2n, ...sum.entries.flatMap(({ constant, norm }) => divisors(constant * norm))]);
        let finite = 0;
        for (const p of primes) for (const place of places.at(p)) finite ^= sum.at(place);
        const negative = (c: NumberFieldElement, i: number): boolean => roots[i]!.signOf(numerators(c)) < 0;
        const real = roots.filter((_, i) => negative(a, i) && negative(b, i)).length;
        expect(finite, `${spelled(numerators(a))}, ${spelled(numerators(b))} in ${field.name}`).toBe(real % 2);
        const other = field.subtract(field.one, a);
        const c = field.multiply(b, b);
        const norm = field.subtract(field.multiply(c, c), field.multiply(a, field.multiply(a, a)));
        const trivial = [[a, field.negate(a)] as const];
        if (!field.isZero(other)) trivial.push([a, other]);
        if (!field.isZero(norm)) trivial.push([a, norm]);
        for (const symbol of trivial) expect(splitsAtFinitePlaces(places, [symbol])).toBe(true);
      }
    }
  });
});

describe('tame symbols of number fields', () => {
  it('vanish where those that PARI/GP computes do', () => {
    const program =
      'tame(nf,a,b)={my(ok=1,P=Set(concat(idealfactor(nf,a)[,1]~,idealfactor(nf,b)[,1]~)));' +
      'for(i=1,#P,my(q=P[i],x=idealval(nf,a,q),y=idealval(nf,b,q));' +
      'if(nfmodpr(nf,a^y/b^x*(-1)^(x*y),nfmodprinit(nf,q))!=1,ok=0));ok};';
    const cases = fields.flatMap((field) =>
      list(6, (i) => {
        const [a, b] = [drawElement(field), drawElement(field)];
        const other = field.subtract(field.one, a);
        if (i === 0) return { field, a, b: field.negate(a), power: 1n };
        if (i === 1 && !field.isZero(other)) return { field, a, b: other, power: 1n };
        return { field, a, b, power: i < 4 ? 1n : 24n };
      }),
    );
    const lines = gpLines(
      [
        program,
        ...cases.map(({ field, a, b, power }) => {
          const [x, y] = [a, b].map((c) => {
            const { numerator, denominator } = field.model.integral(c);
            return `Mod((${spelled(numerator)})/${denominator},P)`;
          });
          return `P=${spelled(field.model.modulus)};print(tame(nfinit(P),${x},${y}^${power}))`;
        }),
      ].join('\n'),
    );
    cases.forEach(({ field, a, b, power }, i) => {
      const name = `${spelled(numerators(a))}, ${spelled(numerators(b))} in ${field.name}`;
      expect(tameSymbolsVanish(field, [{ coefficient: power, a, b }], unlimited), name).toBe(lines[i] === '1');
    });
    expect(lines.filter((line) => line === '0').length).toBeGreaterThan(50);
    expect(lines.filter((line) => line === '1').length).toBeGreaterThan(80);
  });
});

/** The primes that divide n ≠ 0. */
function divisors(n: bigint): bigint[] {
  const found: bigint[] = [];
  let rest = n < 0n ? -n : n;
  for (let p = 2n; p * p <= rest; p++) {
    if (rest % p !== 0n) continue;
    found.push(p);
    while (rest % p === 0n) rest /= p;
  }
  return rest > 1n ? [...found, rest] : found;
}
