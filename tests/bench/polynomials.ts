import { execFileSync } from 'node:child_process';
import { unlimited } from '@/engine/arith/budget';
import { randomBetween, seeded } from '@/engine/arith/seeded';
import { factorOverFinite } from '@/engine/field/factor-finite';
import { factorOverRationals } from '@/engine/field/factor-rational';
import { multiplyIntegers } from '@/engine/field/integer-polynomial';
import type { Polynomial } from '@/engine/field/polynomial';
import { primeField } from '@/engine/field/prime-field';
import { rational } from '@/engine/field/rational';

// Polynomials factored here and by PARI/GP, the same ones in the same run: CPU time for one, median of rounds taken in turn.

const stream = seeded(9);
const rounds = 5;
const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[values.length >> 1] ?? 0;
const draw = (p: bigint, d: number): Polynomial<bigint> => [
  ...Array.from({ length: d }, () => randomBetween(0n, p - 1n, stream)),
  1n,
];
const cpu = (): number => process.cpuUsage().user;

/** Microseconds for one polynomial. */
function here(work: () => void, count: number, times: number): number {
  const from = cpu();
  for (let k = 0; k < times; k++) work();
  return (cpu() - from) / (times * count);
}

function there(vector: string, call: string, count: number, times: number): number {
  const input = `v=[${vector}];t=getabstime();for(k=1,${times},for(i=1,#v,${call}));print(getabstime()-t)\nquit\n`;
  return (1000 * Number(execFileSync('gp', ['-q', '-f', '-s', '512M'], { input, encoding: 'utf8' }))) / (times * count);
}

const spelled = (f: readonly bigint[]): string => `Pol([${[...f].reverse().join(',')}])`;

console.log('over F_p: microseconds for one random polynomial here, for PARI/GP factormod, and their ratio');
for (const p of [2n, 3n, 7n, 101n, 65537n, 33554393n, 1000000007n]) {
  const field = primeField(p);
  const cells = [5, 10, 20, 40, 60].map((d) => {
    const polynomials = Array.from({ length: 40 }, () => draw(p, d));
    const times = d < 15 ? 100 : d < 30 ? 20 : 5;
    const work = (): void => polynomials.forEach((f) => factorOverFinite(field, f, unlimited));
    work();
    const pairs = Array.from({ length: rounds }, () => [
      here(work, polynomials.length, times),
      there(polynomials.map(spelled).join(','), `factormod(v[i],${p})`, polynomials.length, 4 * times),
    ]);
    const [mine, theirs] = [0, 1].map((k) => median(pairs.map((pair) => pair[k]!)));
    return `${d}: ${mine!.toFixed(0)}/${theirs!.toFixed(1)} = ${(mine! / theirs!).toFixed(1)}`;
  });
  console.log(`p = ${p}`.padEnd(16), cells.join('   '));
}

console.log('over Q: milliseconds for one polynomial here, for PARI/GP factor, and their ratio');
const integers = (d: number, digits: number): readonly bigint[] => {
  const size = 10n ** BigInt(digits);
  return [...Array.from({ length: d }, () => randomBetween(-size, size, stream)), 1n + randomBetween(0n, size, stream)];
};
for (const [name, pieces] of [
  ['random', 1],
  ['products of two', 2],
  ['products of five', 5],
] as const) {
  for (const digits of [2, 20, 100]) {
    const cells = [10, 20, 40].map((d) => {
      const polynomials = Array.from({ length: 10 }, () =>
        Array.from({ length: pieces }, () =>
          integers(d / pieces, digits / pieces < 1 ? 1 : Math.ceil(digits / pieces)),
        ).reduce(multiplyIntegers),
      );
      const read = polynomials.map((f) => f.map((c) => rational(c)));
      const times = d < 40 && digits < 100 ? 5 : 1;
      const work = (): void => read.forEach((f) => factorOverRationals(f, unlimited));
      work();
      const pairs = Array.from({ length: rounds }, () => [
        here(work, polynomials.length, times),
        there(polynomials.map(spelled).join(',\\\n'), 'factor(v[i])', polynomials.length, 4 * times),
      ]);
      const [mine, theirs] = [0, 1].map((k) => median(pairs.map((pair) => pair[k]!)) / 1000);
      return `${d}: ${mine!.toFixed(2)}/${theirs!.toFixed(2)} = ${(mine! / theirs!).toFixed(1)}`;
    });
    console.log(`${name}, ${digits} digits`.padEnd(30), cells.join('   '));
  }
}
