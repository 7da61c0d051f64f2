import { readFileSync } from 'node:fs';
import path from 'node:path';

let known: string | undefined;

/** The version of the program, from its package.json; read once. */
export function programVersion(): string {
  known ??= read();
  return known;
}

function read(): string {
  const file = path.join(/* turbopackIgnore: true */ process.cwd(), 'package.json');
  const described: unknown = JSON.parse(readFileSync(file, 'utf8'));
  if (
    typeof described === 'object' &&
    described !== null &&
    'version' in described &&
    typeof described.version === 'string'
  )
    return described.version;
  throw new Error('package.json names no version.');
}
