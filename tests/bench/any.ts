import { unlimited } from '@/engine/arith/budget';
import { compare } from '@/engine/decide/compare';
import { resolveField } from '@/engine/decide/registry';
import { readExpression, readFieldName } from '@/grammar/read';

// Statements about every field: proofs by Steinberg relations and searches for counterexamples, CPU milliseconds each.

const rounds = 7;

const equalities: readonly (readonly [string, string])[] = [
  ['<a> + <b>', '<a+b> + <ab(a+b)>'],
  ['[p][x]', '[p][x+kp] + <x+kp>[(x+kp)/k][x/(x+kp)]'],
  ['[a][1+a]', '[-1][1+a]'],
  ['h[a][1-a]', '0'],
  ['[a^2][1-a^2]', '0'],
  ['<<a, b>>', '<<a, (1-a)b>>'],
  ['<<a, b>>', '<<a+b, -ab>>'],
  ['[a][b]', '[a+b][-b/a]'],
  ['[u][x/(x+y)][y/(x+y)]<v>', '0'],
  ['<<a>><<x^2-a*y^2>>', '0'],
  ['eta[-3][a^2+ab+b^2]', '0'],
  ['<<-1, -1>><1+a^2+b^2+c^2>', '<<-1, -1>>'],
];

const differences: readonly (readonly [string, string])[] = [
  ['[a][b]', '[a+b][-ab]'],
  ['[ab]', '[a] + [b]'],
  ['<a> + <b>', '<a+b> + <-ab(a+b)>'],
  ['<<a, b>>', '<<a, (1+a)b>>'],
  ['[p][x]', '[p][x+kp] - <x+kp>[(x+kp)/k][x/(x+kp)]'],
  ['[a][b][c][1+d]', '[b][a][c][1+d]'],
  ['eta[-1][1+a^2+b^2]', '0'],
];

const cpu = (): number => {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1000;
};

const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[values.length >> 1] ?? 0;

const any = resolveField(readFieldName('any'), unlimited);

function measure(kind: string, verdict: string, statements: readonly (readonly [string, string])[]): void {
  let slowest = 0;
  const medians = statements.map(([left, right]) => {
    const sides = [readExpression(left), readExpression(right)] as const;
    const times = Array.from({ length: rounds }, () => {
      const from = cpu();
      const found = compare(any, sides[0], sides[1], [], unlimited);
      const spent = cpu() - from;
      if (found.verdict !== verdict) throw new Error(`${left} = ${right}: ${found.verdict}`);
      return spent;
    });
    slowest = Math.max(slowest, ...times);
    console.log(`${median(times).toFixed(0).padStart(6)} ms  ${left} = ${right}`);
    return median(times);
  });
  console.log(`${kind}: median ${median(medians).toFixed(0)} ms, slowest single run ${slowest.toFixed(0)} ms\n`);
}

measure('proofs', 'equal', equalities);
measure('counterexamples', 'different', differences);
