import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { unlimited } from '@/engine/arith/budget';
import { compare } from '@/engine/decide/compare';
import { rationalField } from '@/engine/decide/rational-field';
import { readExpression } from '@/grammar/read';

// 400 statements over Q, decided here and by a PARI/GP script that decides the same statements the way one would write it.

const data = path.join(import.meta.dirname, 'data');
const rounds = 5;

interface Case {
  readonly id: string;
  readonly left: string;
  readonly right: string;
  readonly expect: 'equal' | 'different';
}

const cases = readFileSync(path.join(data, 'baseline-q.jsonl'), 'utf8')
  .trim()
  .split('\n')
  .map((line) => JSON.parse(line) as Case)
  .map((row) => ({ ...row, sides: [readExpression(row.left), readExpression(row.right)] as const }));

const cpu = (): number => {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1000;
};

/** CPU milliseconds of this process, all its threads, for the 400 statements. */
function here(work: (row: (typeof cases)[number]) => boolean): number {
  const from = cpu();
  const wrong = cases.filter((row) => work(row) !== (row.expect === 'equal'));
  const spent = cpu() - from;
  if (wrong.length > 0) throw new Error(`wrong verdicts: ${wrong.map(({ id }) => id).join(', ')}`);
  return spent;
}

function there(): number {
  const output = execFileSync('gp', ['-q', '-f', '-s', '1G', path.join(data, 'baseline.gp')], {
    encoding: 'utf8',
    env: { ...process.env, BASELINE_DATA: path.join(data, 'baseline-q.gpdata') },
  });
  const found = /(\d+) cases, 0 mismatches, total (\d+) ms cpu/.exec(output);
  if (found?.[1] !== String(cases.length)) throw new Error(`the PARI/GP script did not agree: ${output}`);
  return Number(found[2]);
}

const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[values.length >> 1] ?? 0;

const decide = (row: (typeof cases)[number]): boolean =>
  rationalField.decide(row.sides[0], row.sides[1], [], unlimited).findings.every(({ same }) => same);
const evidence = (row: (typeof cases)[number]): boolean =>
  compare(rationalField, row.sides[0], row.sides[1], [], unlimited).verdict === 'equal';

const first = here(decide);
here(decide);
const measured = Array.from({ length: rounds }, () => ({
  gp: there(),
  decide: here(decide),
  evidence: here(evidence),
}));
const gp = median(measured.map((row) => row.gp));
const show = (name: string, ms: number): void =>
  console.log(`${name.padEnd(44)} ${ms.toFixed(0).padStart(6)} ms   1/${(gp / ms).toFixed(1)} of PARI/GP`);
console.log(`${cases.length} statements over Q, after reading them; CPU, median of ${rounds} rounds taken in turn`);
show('PARI/GP', gp);
show('verdict', median(measured.map((row) => row.decide)));
show('verdict with all evidence written out', median(measured.map((row) => row.evidence)));
show('verdict, the first pass of a new process', first);
