import { readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

const header =
  '// Written from quadrel.ohm by write-source.ts, so that the grammar needs no file system where it runs.\n';

/**
 * The module that carries the grammar's text, as it must stand in quadrel-source.ts.
 *
 * Run this file (`npx tsx grammar/write-source.ts`) after every change of quadrel.ohm; a test holds the two together.
 */
export function grammarModule(): string {
  const text = readFileSync(new URL('./quadrel.ohm', import.meta.url), 'utf8');
  if (text.includes('`') || text.includes('${')) throw new Error('quadrel.ohm must have no backtick and no ${');
  return `${header}export const quadrelSource = String.raw\`${text}\`;\n`;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  writeFileSync(new URL('./quadrel-source.ts', import.meta.url), grammarModule());
}
