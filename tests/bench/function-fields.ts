import { unlimited } from '@/engine/arith/budget';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { resolveField } from '@/engine/decide/registry';
import {
  integerElement,
  letterElement,
  powerElement,
  productElement,
  quotientElement,
  sumElement,
  type Element,
} from '@/engine/expression/element';
import { angle, eta, integer, negate, product, sum, symbol, type Expression } from '@/engine/expression/expression';
import { readFieldName } from '@/grammar/read';
import { cpuCost, fittedExponent } from '../harness/measure';

// How the cost of a decision over 𝔽_7(t) grows with the number of words. Entries are polynomials and quotients of degree at most 3,
// read, factored and reduced in the time that is measured.

const stream = seeded(5);
const upTo = (n: number): bigint => randomBetween(0n, BigInt(n), stream);
const field = resolveField(readFieldName('F_7(t)'), unlimited);

function polynomial(): Element {
  const degree = Number(upTo(2)) + 1;
  const terms: Element[] = [productElement([integerElement(1n + upTo(5)), powerElement(letterElement('t'), degree)])];
  for (let i = degree - 1; i >= 0; i -= 1)
    terms.push(productElement([integerElement(upTo(6)), powerElement(letterElement('t'), i)]));
  return sumElement(terms);
}

const entry = (): Element => (upTo(3) === 0n ? quotientElement(polynomial(), polynomial()) : polynomial());
const shapes: readonly (() => Expression)[] = [
  () => symbol([entry()]),
  () => symbol([entry(), entry()]),
  () => product([angle([entry()]), symbol([entry(), entry()])]),
  () => product([eta(), symbol([entry(), entry(), entry()])]),
  () => angle([entry()]),
];
const word = (): Expression => product([integer(1n + upTo(4)), shapes[Number(upTo(shapes.length - 1))]!()]);

const cost = (left: Expression, right: Expression): number =>
  cpuCost(() => void field.decide(left, right, [], unlimited).findings.every(({ same }) => same), 7);

const sizes = [100, 200, 400, 700, 1_000, 1_500, 2_000, 3_000];
cost(sum(Array.from({ length: 1_000 }, word)), integer(0n)); // compiles
for (const [name, right] of [
  ['words over F_7(t) against 0', (): Expression => integer(0n)],
  [
    'words over F_7(t) against themselves in another order',
    (words: readonly Expression[]): Expression => sum([...words].reverse()),
  ],
  [
    'words over F_7(t) against as many others',
    (words: readonly Expression[]): Expression => sum(words.map((w) => negate(w))),
  ],
] as const) {
  const points = sizes.map((n) => {
    const words = Array.from({ length: n }, word);
    return [n, cost(sum(words), right(words))] as const;
  });
  console.log(`${name}: ${points.map(([n, ms]) => `${n}: ${ms.toFixed(1)} ms`).join('  ')}`);
  console.log(`  fitted exponent ${fittedExponent(points).toFixed(2)} (allowed: 1.15)`);
}
