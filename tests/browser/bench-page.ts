import type { Locator, Page } from 'playwright-core';
import { expect } from 'vitest';
import { openPage, type Sight } from '../harness/browser';

export interface BenchPage {
  readonly page: Page;
  readonly line: Locator;
  readonly picker: Locator;
  /** The word on the sheet: "Equal", or the canonical form of an expression. */
  readonly word: Locator;
  readonly status: Locator;
}

export const benchOf = (page: Page): BenchPage => ({
  page,
  line: page.getByRole('textbox', { name: 'Statement or expression' }),
  picker: page.getByRole('button', { name: /^Over the field/ }),
  word: page.locator('.verdict h2'),
  status: page.locator('.reading-status'),
});

/** Opens the bench with a statement over a field, or bare, and waits until one can write. */
export async function openBench(asked?: { field: string; statement: string }, sight?: Sight): Promise<BenchPage> {
  const query = asked ? `?${new URLSearchParams(asked).toString()}` : '';
  const bench = benchOf(await openPage(`/bench${query}`, sight));
  await bench.line.waitFor();
  return bench;
}

/** What stands in the line, without the mark that stands where something is missing. */
export const written = (bench: BenchPage): Promise<string> =>
  bench.line.evaluate((line) =>
    Array.from(line.querySelectorAll('.cm-line'), (row) =>
      Array.from(row.childNodes, (node) =>
        node instanceof HTMLElement && node.contentEditable === 'false' ? '' : (node.textContent ?? ''),
      ).join(''),
    ).join('\n'),
  );

/** Polls long enough for a busy machine. */
export const eventually = <T>(look: () => T) => expect.poll(look, { timeout: 15_000 });

/** Waits for a current answer with this word. */
export async function expectWord(bench: BenchPage, word: string): Promise<void> {
  await eventually(() => bench.word.innerText().catch(() => '')).toBe(word);
  await eventually(() => bench.page.locator('.is-old').count()).toBe(0);
}

/** Whether anything on the page is wider than the window. */
export const scrollsSideways = (page: Page): Promise<boolean> =>
  page.evaluate(() => document.documentElement.scrollWidth > document.documentElement.clientWidth);
