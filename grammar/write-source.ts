import { readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { grammar } from 'ohm-js';

const header = `// Written from quadrel.ohm by write-source.ts: the grammar as the parser loads it a hundred times faster than from its
// text, and without a file system.
`;

/** The text of quadrel.ohm. */
export const grammarText = (): string => readFileSync(new URL('./quadrel.ohm', import.meta.url), 'utf8');

/**
 * The module that carries the grammar, as it must stand in quadrel-recipe.ts.
 *
 * Run this file (`npx tsx grammar/write-source.ts`) after every change of quadrel.ohm; a test holds the two together.
 */
export function grammarModule(): string {
  // The parser offers this method and leaves it out of its types.
  const recipe = (grammar(grammarText()) as unknown as { toRecipe(): string }).toRecipe();
  if (recipe.includes('`') || recipe.includes('${')) throw new Error('quadrel.ohm must have no backtick and no ${');
  return `${header}export const quadrelRecipe = String.raw\`${recipe}\`;\n`;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  writeFileSync(new URL('./quadrel-recipe.ts', import.meta.url), grammarModule());
}
