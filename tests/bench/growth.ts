import { isMainThread, Worker } from 'node:worker_threads';
import { unlimited } from '@/engine/arith/budget';
import { primesBelow } from '@/engine/arith/small-primes';
import { seeded, randomBetween } from '@/engine/arith/seeded';
import { rationalField } from '@/engine/decide/rational-field';
import { integerElement } from '@/engine/expression/element';
import { integer, product, sum, symbol, type Expression } from '@/engine/expression/expression';
import { readExpression } from '@/grammar/read';
import { threadLimits } from '@/lib/compute/thread-limits';
import { cpuCost, fittedExponent } from '../harness/measure';

// In a thread with the limits of the compute threads: how the cost of a decision grows with the number of terms and of primes, and powers that must not be multiplied out.

const stream = seeded(11);
const upTo = (n: number): bigint => randomBetween(1n, BigInt(n), stream);

const cost = (left: Expression, right: Expression): number =>
  cpuCost(() => void rationalField.decide(left, right, [], unlimited).findings.every(({ same }) => same), 20);

function report(name: string, points: readonly (readonly [number, number])[]): void {
  console.log(`${name}: ${points.map(([n, ms]) => `${n}: ${ms.toFixed(1)} ms`).join('  ')}`);
  console.log(`  fitted exponent ${fittedExponent(points).toFixed(2)} (allowed: 1.1)`);
}

/** c·[a][b]… with one to three entries below 5 000. */
const randomTerm = (): Expression =>
  product([integer(upTo(5)), symbol(Array.from({ length: Number(upTo(3)) }, () => integerElement(1n + upTo(5000))))]);

function measure(): void {
  // compiles
  cost(sum(Array.from({ length: 3_000 }, randomTerm)), integer(0n));

  const sizes = [1_000, 2_000, 4_000, 7_000, 10_000];
  report(
    'random terms over Q',
    sizes.map((n) => [n, cost(sum(Array.from({ length: n }, randomTerm)), integer(0n))] as const),
  );

  // Primes of one size, so that it is their number that grows and not the cost of recognising each.
  const primes = [...primesBelow(260_000)].filter((p) => p > 100_000).map(BigInt);
  report(
    'terms [p][q] in n primes between 100 000 and 260 000',
    sizes.map((n) => {
      const chosen = Array.from({ length: n }, (_, i) => primes[Math.floor((i * primes.length) / n)] ?? 2n);
      const words = chosen.map((p, i) => symbol([integerElement(p), integerElement(chosen[(i + 1) % n] ?? 2n)]));
      return [n, cost(sum(words), integer(0n))] as const;
    }),
  );

  for (const text of ['([2]+[3]+[30])^40', '([6]+<10>)^30']) {
    const power = readExpression(text);
    console.log(`${text} against 0: ${cost(power, integer(0n)).toFixed(1)} ms (allowed: 50)`);
  }
}

// tsx reads TypeScript in the main thread only, unless it is asked
const start = `import('tsx/esm/api').then(({ register }) => (register(), import(${JSON.stringify(import.meta.url)})))`;
if (isMainThread) new Worker(start, { eval: true, resourceLimits: threadLimits(512) });
else measure();
