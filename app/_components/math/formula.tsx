import katex from 'katex';
import { breakable } from './breakable';

/** Braces around ⟨a⟩ keep a line from breaking inside it. */
const macros: Record<string, string> = {
  '\\q': '{\\langle #1\\rangle}',
  '\\pf': '{\\langle\\!\\langle #1\\rangle\\!\\rangle}',
  '\\e': '\\varepsilon',
  '\\Q': '\\mathbb{Q}',
  '\\R': '\\mathbb{R}',
  '\\C': '\\mathbb{C}',
  '\\Z': '\\mathbb{Z}',
  '\\F': '\\mathbb{F}',
  '\\K': 'K^{\\mathrm{MW}}',
  '\\GW': '\\mathrm{GW}',
  '\\ne': '\\mathrel{\\char"2260}',
};

/** Marks numbers longer than a narrow line, the only ones that may break anywhere (in the sheet `mathematics.css`). */
const markLong = (tex: string): string => tex.replace(/\d{25,}/g, (run) => `\\htmlClass{long-number}{${run}}`);

const kept = new Map<string, string>();
const keptAtMost = 2000;

/**
 * TeX as HTML with MathML beside it for screen readers. TeX that cannot be set comes back as it was typed.
 * Lines may break before + − = outside brackets only; with `breaks` false, where TeX would break them.
 */
export function formulaHtml(tex: string, breaks = true): string {
  const key = `${breaks ? '1' : '0'}${tex}`;
  const known = kept.get(key);
  if (known !== undefined) return known;
  const html = katex.renderToString(markLong(breaks ? breakable(tex) : tex), {
    throwOnError: false,
    displayMode: false,
    output: 'htmlAndMathml',
    strict: false,
    trust: (context) => context.command === '\\htmlClass' && context.class === 'long-number',
    maxExpand: 20_000,
    macros: { ...macros },
  });
  if (kept.size >= keptAtMost) kept.clear();
  kept.set(key, html);
  return html;
}

/** Set mathematics, in server and client components alike. */
export function Formula({ tex, breaks = true, className }: { tex: string; breaks?: boolean; className?: string }) {
  return <span className={className} dangerouslySetInnerHTML={{ __html: formulaHtml(tex, breaks) }} />;
}
