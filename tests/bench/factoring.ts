import { execFileSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { unlimited } from '@/engine/arith/budget';
import { factor } from '@/engine/arith/factor';
import { isPrime } from '@/engine/arith/prime';
import { randomBetween, seeded } from '@/engine/arith/seeded';

/** Digits of each of the two primes, and how many products are taken. */
const rows = [
  [10, 20],
  [12, 20],
  [15, 20],
  [20, 5],
] as const;

const stream = seeded(4);

function prime(digits: number): bigint {
  let n = randomBetween(10n ** BigInt(digits - 1), 10n ** BigInt(digits) - 1n, stream);
  while (!isPrime(n)) n++;
  return n;
}

const milliseconds = (): number => process.cpuUsage().user / 1000;

/** CPU milliseconds PARI/GP takes for the same numbers, each factored `times` times so that its clock can see it. */
function baseline(numbers: readonly bigint[], times: number): number {
  const program = `v=[${numbers.join(',')}];t=getabstime();for(k=1,${times},for(i=1,#v,factor(v[i])));print(getabstime()-t)\nquit\n`;
  return Number(execFileSync('gp', ['-q', '-f'], { input: program, encoding: 'utf8' })) / times;
}

/** Prints, for products of two primes of equal length, the CPU time of one factorisation here, in PARI/GP, and the ratio. */
export function run(): void {
  factor(prime(15) * prime(15), unlimited); // compiles
  for (const [digits, count] of rows) {
    const numbers = Array.from({ length: count }, () => prime(digits) * prime(digits));
    let slowest = 0;
    let whole = 0;
    for (const n of numbers) {
      const from = milliseconds();
      factor(n, unlimited);
      const taken = milliseconds() - from;
      whole += taken;
      if (taken > slowest) slowest = taken;
    }
    const gp = baseline(numbers, 10);
    console.log(
      `${2 * digits} digits, ${count} numbers: ${(whole / count).toFixed(1)} ms each, slowest ${slowest.toFixed(1)} ms; ` +
        `PARI/GP ${(gp / count).toFixed(1)} ms; ratio ${(whole / gp).toFixed(1)}`,
    );
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) run();
