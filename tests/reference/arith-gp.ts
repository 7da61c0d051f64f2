import { execFileSync } from 'node:child_process';

/**
 * The lines PARI/GP (Debian's pari-gp; The PARI Group, https://pari.math.u-bordeaux.fr) prints for a program, from one
 * process. Values travel in decimal, so that nothing of the engine is shared.
 */
export function gpLines(program: string): string[] {
  const output = execFileSync('gp', ['-q', '-f', '-s', '256M'], {
    input: `${program}\nquit\n`,
    encoding: 'utf8',
    maxBuffer: 1 << 28,
  });
  if (output.includes('***')) throw new Error(`gp: ${output.slice(0, 2000)}`);
  return output.split('\n').filter((line) => line !== '');
}

/** A line `v = [a, b, …];` of such a program, broken so that no line is too long for its reader. */
export const gpVector = (name: string, entries: readonly (bigint | number | string)[]): string =>
  `${name} = [\\\n${entries.join(',\\\n')}];`;
